import { loadBuild } from '../../builds/server/load-build.ts';
import { newId } from '../../../db/columns.ts';
import { verb } from '../../../server/verb.ts';
import { type ImportList, type ImportResult } from '../import-list.ts';
import { planImport } from '../import-rows.ts';
import { applyChanges } from './apply-changes.ts';
import { loadParts } from './load-parts.ts';
import { readList } from './read-list.ts';

/**
 * Reads a list, says row by row what it would do, and when told to takes all of it or nothing. As long as a row
 * has a problem, taking it only shows it again.
 * @throws Invalid at `file` or `text` when it is no list, or too long
 */
export const importParts = verb(
  { may: 'part.change' },
  async (context, input: ImportList & { readonly build: string }): Promise<ImportResult> => {
    const { id: buildId } = await loadBuild(context, input.build);
    const { list, body } = readList(input);
    const unmatched = { ...list, rows: null, problems: 0, adds: 0, updates: 0 };
    if (input.step === 'read' || Object.keys(list.columnErrors).length > 0) {
      return { taken: null, view: unmatched };
    }
    const existing = await loadParts(context, buildId);
    const plan = planImport(body, list.columns, existing, input.existing, newId);
    const adds = plan.changes.filter((change) => change.do === 'add').length;
    const view = {
      ...list,
      rows: plan.rows,
      problems: plan.problems,
      adds,
      updates: plan.changes.length - adds,
    };
    if (input.step !== 'take' || plan.problems > 0) return { taken: null, view };
    if (plan.changes.length > 0) await applyChanges(context, buildId, plan.changes);
    return { taken: { added: view.adds, updated: view.updates }, view };
  },
);
