import { describe, expect, it } from 'vitest';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { writeEdl } from '../../../../src/domain/edit/write-edl.ts';
import { stringOut } from '../../../../src/domain/marks/string-out.ts';
import { writeMarksCsv } from '../../../../src/domain/marks/write-marks-csv.ts';

const PAL = { num: 25, den: 1 };
const CLIPS = [
  {
    clip: 'C0043',
    file: 'C0043.MP4',
    rate: PAL,
    start: 90_000,
    frames: 100,
    marks: [
      { frame: 30, name: '=grind here', colour: null },
      { frame: 100, name: 'past the end', colour: null },
    ],
  },
  {
    clip: 'P1',
    file: null,
    rate: { num: 50, den: 1 },
    start: 0,
    frames: 100,
    marks: [{ frame: 50, name: 'wrong port', colour: 'ORANGE' }],
  },
];

describe('The marks of the shop on whole clips', () => {
  const edit = stringOut('Press', CLIPS, PAL);

  it('stand at their clip’s place one after another, those outside left out', () => {
    expect(edit.markers.map(({ record, name }) => [record.valueOf(), name])).toEqual([
      [30, '=grind here'],
      [125, 'wrong port'],
    ]);
    expect(edit.frames.valueOf()).toBe(150);
  });

  it('come back from an edit list', () => {
    const read = readEdl(writeEdl(edit), { rate: PAL, clipRates: new Map([['P1', { num: 50, den: 1 }]]) });
    expect(read.ok && read.value.markers).toEqual([{ ...edit.markers[0], colour: 'RED' }, edit.markers[1]]);
  });

  it('are a list with both times, in which no cell is a formula', () => {
    expect(writeMarksCsv(edit)).toBe(
      [
        'timecode,seconds,clip,clip timecode,text,colour',
        "00:00:01:05,1.200,C0043,01:00:01:05,'=grind here,",
        '00:00:05:00,5.000,P1,00:00:01:00,wrong port,orange',
        '',
      ].join('\r\n'),
    );
  });
});
