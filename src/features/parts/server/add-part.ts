import { loadBuild } from '../../builds/server/load-build.ts';
import { newId } from '../../../db/columns.ts';
import { verb } from '../../../server/verb.ts';
import { type PartFields } from '../part.ts';
import { applyChange } from './apply-change.ts';

/** Adds a part to a build. @throws Invalid at `number` when another part has it */
export const addPart = verb(
  { may: 'part.change' },
  async (context, input: PartFields & { readonly build: string }) => {
    const { id: buildId } = await loadBuild(context, input.build);
    const id = newId();
    await applyChange(context, buildId, { do: 'add', id, fields: fieldsOf(input) });
    return { id, version: 1 };
  },
);

function fieldsOf(input: PartFields) {
  const { number, name, kind, quantity, material, size, aliases, inPlans, remark } = input;
  return { number, name, kind, quantity, material, size, aliases: [...aliases], inPlans, remark };
}
