import { sortNotes } from '../notes/note-place.ts';
import { type PublishCheck } from './publish-check.ts';
import { type PublishFacts } from './publish-facts.ts';
import { capital, sayCount, sayList } from './say.ts';

/** Parts that the notes name: all in the list, and those that the plans do not show. */
export function checkParts({ notes, parts, revision }: PublishFacts): PublishCheck[] {
  const known = new Map(parts.map((part) => [part.id, part]));
  const sorted = sortNotes(notes);
  const lost = sorted.filter((note) => note.partIds.some((id) => !known.has(id)));
  const named = [...new Set(sorted.flatMap((note) => note.partIds))];
  const outside = named.flatMap((id) => known.get(id) ?? []).filter((part) => !part.inPlans);
  const every: PublishCheck = {
    id: 'parts-listed',
    level: 'must',
    holds: lost.length === 0,
    sentence:
      lost.length === 0
        ? 'Every part in the notes is in the parts list.'
        : `${capital(sayCount(lost.length, 'note'))} ${lost.length === 1 ? 'names' : 'name'} a part that is not in the parts list.`,
    place: { section: 'notes', ids: lost.map((note) => note.id) },
  };
  if (outside.length === 0) return [every];
  const numbers = sayList(outside.map((part) => part.number));
  const plans = revision === null ? 'the plans' : `revision ${revision}`;
  const sentence =
    outside.length === 1
      ? `Part ${numbers} is not in ${plans}. Viewers will see it as not in the plans.`
      : `Parts ${numbers} are not in ${plans}. Viewers will see them as not in the plans.`;
  const ids = outside.map((part) => part.id);
  return [
    every,
    { id: 'parts-in-plans', level: 'should', holds: false, sentence, place: { section: 'parts', ids } },
  ];
}
