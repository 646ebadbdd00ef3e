import { partNumberKey } from '../../domain/part-numbers.ts';
import { type Part, type PartChange } from './part.ts';

/** A part as it is stored, deleted ones included. */
export interface StoredPart extends Part {
  readonly deleted: boolean;
}

export interface CheckedChanges {
  /** Whether a change is about a part that this build never had. */
  readonly missing: boolean;
  /** What is stored of every row that is not as its change saw it. */
  readonly conflicts: readonly StoredPart[];
  /** A sentence a field, such as `changes.3.number`. */
  readonly errors: Readonly<Record<string, string>>;
  /** How many parts the build has afterwards. */
  readonly count: number;
}

/**
 * Decides whether changes to a build's parts can be taken together.
 * @param stored every part of the build by id
 * @param references how often something refers to a part that is to be deleted
 */
export function checkChanges(
  stored: ReadonlyMap<string, StoredPart>,
  changes: readonly PartChange[],
  references: ReadonlyMap<string, number>,
): CheckedChanges {
  const conflicts: StoredPart[] = [];
  const errors: Record<string, string> = {};
  const changed = new Set(changes.map(({ id }) => id));
  const holders = new Map<string, string>();
  let count = 0;
  let missing = false;
  for (const part of stored.values()) {
    if (part.deleted || changed.has(part.id)) continue;
    holders.set(partNumberKey(part.number), part.name);
    count += 1;
  }
  for (const [index, change] of changes.entries()) {
    const before = stored.get(change.id);
    const at = `changes.${String(index)}`;
    if (before ? !fits(before, change) : change.do !== 'add') {
      if (before) conflicts.push(before);
      else missing = true;
      continue;
    }
    if (change.do === 'delete') {
      const times = references.get(change.id) ?? 0;
      if (times > 0) errors[at] = sayReferred(before?.number ?? '', times);
      continue;
    }
    count += 1;
    const number = change.do === 'restore' ? (before?.number ?? '') : change.fields.number;
    const key = partNumberKey(number);
    const holder = holders.get(key);
    if (holder === undefined)
      holders.set(key, change.do === 'restore' ? (before?.name ?? '') : change.fields.name);
    else errors[`${at}.number`] = `Number ${number} is taken by “${holder}”. Give this part another.`;
  }
  return { missing, conflicts, errors, count };
}

/** Whether a row that is there is as its change saw it. */
function fits(before: StoredPart, change: PartChange): boolean {
  if (change.do === 'add') return false;
  return before.version === change.version && before.deleted === (change.do === 'restore');
}

function sayReferred(number: string, times: number): string {
  const where = times === 1 ? 'a note or a moment' : `${String(times)} notes or moments`;
  return `Part ${number} stays: ${where} of the footage ${times === 1 ? 'refers' : 'refer'} to it. It was not deleted.`;
}
