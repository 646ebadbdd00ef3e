import { loadBuild } from '../../builds/server/load-build.ts';
import { writeCsv } from '../../../domain/csv/write-csv.ts';
import { read } from '../../../server/verb.ts';
import { PART_FIELDS, PART_LABELS } from '../part.ts';
import { textsOf } from '../part-texts.ts';
import { loadParts } from './load-parts.ts';

/** The parts list as a CSV file, which our importer reads back. */
export const exportParts = read(
  { may: 'workshop.see-bench' },
  async (context, input: { readonly build: string }) => {
    const build = await loadBuild(context, input.build);
    const rows = (await loadParts(context, build.id)).map((part) => {
      const texts = textsOf(part);
      return PART_FIELDS.map((field) => texts[field]);
    });
    return {
      name: `${build.slug}-parts.csv`,
      // Spreadsheets take a list without this mark for an older encoding.
      text: `\uFEFF${writeCsv([PART_FIELDS.map((field) => PART_LABELS[field]), ...rows])}`,
    };
  },
);
