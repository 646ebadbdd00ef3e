import { type Part, PART_FIELDS } from '../part.ts';
import { type PartTexts, readPart } from '../part-texts.ts';

/** Reads the parts from the list that the page holds. A row that says something else than a part is left out. */
export function readPageParts(root: ParentNode): Part[] {
  return [...root.querySelectorAll<HTMLTableRowElement>('tr[data-part]')].flatMap((row) => {
    const texts = Object.fromEntries(
      PART_FIELDS.map((field) => {
        const cell = row.querySelector<HTMLElement>(`[data-field=${field}]`);
        return [field, (cell?.dataset['text'] ?? cell?.textContent ?? '').trim()];
      }),
    ) as PartTexts;
    const read = readPart(texts);
    const { part: id = '', version } = row.dataset;
    return read.ok ? [{ ...read.value, id, version: Number(version) }] : [];
  });
}
