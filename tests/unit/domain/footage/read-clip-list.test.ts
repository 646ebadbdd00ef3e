import { describe, expect, test } from 'vitest';
import { MOST_LISTED_CLIPS, readClipList } from '../../../../src/domain/footage/read-clip-list.ts';

const RATE = { num: 25, den: 1 };
const names = (text: string) => readClipList(text, RATE).clips.map(({ clip }) => clip.name);
const problems = (text: string) => readClipList(text, RATE).problems;

describe('a list of clips', () => {
  test('gives each clip what its columns say', () => {
    const text =
      'File Name;Cam;Created;Duration;FPS;TC;Pace;Stage;Parts\nC1.MP4;Big;2026-11-02 14:22:07.5 +01:00;00:01:00;00;29.97;01:00:00;02;1/4;Drum;117, 118\n';
    const quoted = text.replace('00:01:00;00', '"00:01:00;02"').replace('01:00:00;02', '"01:00:00;02"');
    const { clips, problems: told } = readClipList(quoted, RATE);
    expect(told).toEqual([]);
    expect(clips).toEqual([
      {
        line: 2,
        clip: {
          name: 'C1.MP4',
          camera: 'Big',
          createdWall: '2026-11-02T14:22:07.500',
          createdOffset: 60,
          frames: 1800,
          rate: { num: 30_000, den: 1001 },
          startLabel: 107_894,
          drop: true,
          pace: { num: 1, den: 4 },
          stage: 'Drum',
          parts: ['117', '118'],
        },
      },
    ]);
  });

  test('takes the rate that was said where a row has none, and a length in seconds', () => {
    const [row] = readClipList('name,length\nA,2.5', RATE).clips;
    expect(row?.clip).toMatchObject({ rate: RATE, frames: 63, createdWall: null, camera: null });
  });

  test('with mixed line ends, empty lines and a mark before it is read', () => {
    expect(names('\uFEFFname,length\r\nA,1\rB,2\n\n\nC,3\r\n')).toEqual(['A', 'B', 'C']);
  });

  test('with more empty rows than clips may be is read to its end', () => {
    expect(names(`name,length\n${' , \n'.repeat(MOST_LISTED_CLIPS + 2)}A,1`)).toEqual(['A']);
  });

  test('that was cut off inside quotes is read up to there, and the line told', () => {
    const text = 'name,stage\nA,"Drum"\nB,"Dr';
    expect(names(text)).toEqual(['A']);
    expect(problems(text)).toMatchObject([{ line: 3, text: expect.stringContaining('breaks off') }]);
  });

  test.each([
    ['name,length\nA,soon', 2, 'length'],
    ['name,rate\nA,26.5', 2, 'rate'],
    ['name,filmed\nA,2026-02-30 10:00', 2, 'filmed'],
    ['name,timecode\nA,01:00:00:99', 2, 'timecode'],
    ['name,pace\nA,fast', 2, 'pace'],
  ])('%j keeps the clip and tells what is wrong', (text, line, column) => {
    expect(names(text)).toEqual(['A']);
    expect(problems(text)).toMatchObject([{ line, text: expect.stringContaining(column) }]);
  });

  test.each(['name,length\nA,0', 'name,camera\n,Big', `name\n${'x'.repeat(201)}`])(
    '%j gives no clip, and says why',
    (text) => {
      expect(names(text)).toEqual([]);
      expect(problems(text)).toHaveLength(1);
    },
  );

  test('that names no columns says which there are', () => {
    expect(problems('C0001.MP4,Big')[0]?.text).toContain('name, camera, filmed');
    expect(problems('')[0]?.text).toContain('empty');
  });

  test('of five megabytes is read as far as is taken, and says from which line it was not', () => {
    const text = `name,length,remark\n${`A0001.MP4,1:00,${'x'.repeat(200)}\n`.repeat(24_000)}`;
    expect(text.length).toBeGreaterThan(5_000_000);
    const { clips, problems: told } = readClipList(text, RATE);
    expect(clips).toHaveLength(MOST_LISTED_CLIPS);
    expect(told).toMatchObject([{ line: MOST_LISTED_CLIPS + 2 }]);
  });
});
