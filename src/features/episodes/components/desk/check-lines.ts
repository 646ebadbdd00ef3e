import { type Check } from '../../../../components/CheckList.tsx';
import { type PublishCheck } from '../../../../domain/episode-checks/publish-check.ts';

/**
 * The checks as lines, each leading to where it is put right.
 * @param desk the path of the episode's desk; empty on the desk itself
 */
export function checkLines(checks: readonly PublishCheck[], desk = ''): Check[] {
  return checks.map(({ sentence, holds, level, place: { section, ids } }) => ({
    text: level === 'should' && !holds ? `${sentence} (You decide.)` : sentence,
    state: holds ? 'right' : level === 'must' ? 'wrong' : 'open',
    ...(!holds && { href: `${desk}#${section === 'notes' && ids[0] ? `note-${ids[0]}` : section}` }),
  }));
}
