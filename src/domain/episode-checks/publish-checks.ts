import { checkBasics, checkChapterList } from './check-basics.ts';
import { checkCautions, checkNotes } from './check-notes.ts';
import { checkParts } from './check-parts.ts';
import { type PublishCheck } from './publish-check.ts';
import { type PublishFacts } from './publish-facts.ts';

/**
 * The checks before publishing, computed from what is there now: each says whether it holds, what is wrong, and
 * where it is put right. In the order of the desk.
 */
export function publishChecks(facts: PublishFacts): PublishCheck[] {
  return [
    ...checkBasics(facts),
    ...checkChapterList(facts),
    ...checkParts(facts),
    ...checkNotes(facts),
    ...checkCautions(facts),
  ];
}
