import { describe, expect, it } from 'vitest';
import { findTopics } from '../../../../src/domain/cautions/find-topics.ts';
import { gatherCautions } from '../../../../src/domain/cautions/gather-cautions.ts';
import { CAUTION_TOPICS, isCautionTopic } from '../../../../src/domain/cautions/topics.ts';
import { USUAL_CAUTIONS } from '../../../../src/domain/cautions/usual-cautions.ts';

const note = (id: string, frame: number, topic: string | null) => ({ id, frame, endFrame: null, topic });

describe('gatherCautions', () => {
  it('tells each topic once, where it first comes', () => {
    const notes = [note('c', 300, 'pressure'), note('b', 200, 'rotating'), note('a', 100, 'pressure')];
    expect(gatherCautions(notes)).toEqual([
      { topic: 'pressure', noteId: 'a', frame: 100 },
      { topic: 'rotating', noteId: 'b', frame: 200 },
    ]);
  });

  it('leaves notes without a topic of ours alone', () => {
    expect(gatherCautions([note('a', 1, null), note('b', 2, 'weather')])).toEqual([]);
  });
});

describe('The usual cautions', () => {
  it.each(CAUTION_TOPICS)('on %s fit beside a note and name who published more', (topic) => {
    const { words, sources } = USUAL_CAUTIONS[topic];
    expect(words.length).toBeLessThan(260);
    expect(words).toMatch(/\.$/);
    expect(sources.every(({ publisher, title, number }) => publisher && title && number)).toBe(true);
    expect(sources.length).toBeGreaterThan(0);
  });

  it.each(['load', 'electric', 'fire', 'paint', 'food', 'pressure'] as const)(
    'on %s defer to local rules or to someone qualified',
    (topic) => {
      expect(USUAL_CAUTIONS[topic].words).toMatch(/local|licensed|qualified/i);
    },
  );

  it('know their own topics', () => {
    expect(isCautionTopic('arc')).toBe(true);
    expect(isCautionTopic('toString')).toBe(false);
    expect(isCautionTopic(null)).toBe(false);
  });
});

describe('findTopics', () => {
  // Our own sentences: no published set covers these words.
  it.each([
    ['Guard the drum before it turns under power.', ['rotating']],
    ['The cylinder came with G 3/8 ports.', ['pressure']],
    ['Gussets to base rail: E7018, 3.2 mm rods, 115 A.', ['arc']],
    ['Weld the galvanised bracket.', ['zinc', 'arc']],
    ['Relief set to 160 bar.', ['pressure']],
    ['Wiped down with brake cleaner.', ['solvents']],
    ['Face and centre the end, 412 mm.', []],
    ['The new barn is painted.', []],
  ])('in %j finds %j', (text, topics) => {
    expect(findTopics(text)).toEqual(topics);
  });
});
