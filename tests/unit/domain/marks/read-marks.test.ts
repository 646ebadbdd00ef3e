import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { writeEdl } from '../../../../src/domain/edit/write-edl.ts';
import { writeOtio } from '../../../../src/domain/edit/write-otio.ts';
import { markOfNote } from '../../../../src/domain/marks/note-marks.ts';
import { readMarks, readMarkWords } from '../../../../src/domain/marks/read-marks.ts';
import { writeMarksCsv } from '../../../../src/domain/marks/write-marks-csv.ts';
import { LIST } from '../../../support/edit-lists.ts';

const RATE = { num: 25, den: 1 };

describe('The words of a mark', () => {
  it('give back the kind, the parts and the text that a note was written as', () => {
    const note = { kind: 'size', text: 'Face it: 412 mm.', topic: null, parts: ['117', 'A-2'] } as const;
    expect(readMarkWords(markOfNote(note).name)).toEqual({
      as: 'note',
      kind: 'size',
      parts: ['117', 'A-2'],
      text: 'Face it: 412 mm.',
    });
    expect(readMarkWords('chapter: Housings')).toMatchObject({ as: 'chapter', text: 'Housings' });
  });

  it('are a step where an editor wrote them', () => {
    const step = { as: 'note', kind: 'step', parts: [] };
    for (const text of ['ANIM FIX NEEDED', 'look: too dark', ''])
      expect(readMarkWords(text)).toEqual({ ...step, text });
  });
});

describe('The marks of a file', () => {
  const read = readEdl(LIST, { rate: RATE });
  if (!read.ok) throw new Error(read.error);
  const markers = [
    { record: new Fraction(50), name: 'SHAFT IN', colour: 'RED' },
    { record: new Fraction(300), name: 'chapter: Housings', colour: 'WHITE' },
  ];
  const edit = { ...read.value, markers };

  it.each([
    ['an edit list', writeEdl(edit)],
    ['a timeline', writeOtio(edit)],
    ['CSV', writeMarksCsv(edit)],
  ])('are read from %s as they were written', (_form, text) => {
    const marks = readMarks(text, RATE);
    expect(marks.ok && marks.value.map(({ record, ...mark }) => ({ ...mark, at: Number(record) }))).toEqual(
      markers.map(({ record, ...mark }) => ({ ...mark, at: Number(record) })),
    );
  });

  it('may stand at seconds alone, and say the line that is wrong', () => {
    expect(readMarks('seconds,text\n12.01,Housings\n', RATE)).toMatchObject({
      ok: true,
      value: [{ name: 'Housings', colour: null }],
    });
    expect(readMarks('timecode,text\n00:00:01:00,A\n00:00:01:25,B\n', RATE)).toEqual({
      ok: false,
      error: 'Line 3: 00:00:01:25 has frames beyond 24.',
    });
    expect(readMarks('at;words\n1;2\n', RATE)).toEqual({
      ok: false,
      error: 'The list needs a column “text”, and one “timecode” or “seconds”.',
    });
  });
});
