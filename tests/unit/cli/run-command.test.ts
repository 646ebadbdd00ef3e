import { describe, expect, it } from 'vitest';
import { right, wrong } from '../../../src/domain/answer.ts';
import { answerLine } from '../../../src/cli/answer-line.ts';
import { runCommand } from '../../../src/cli/run-command.ts';

const FILES: Readonly<Record<string, string>> = {
  'chapters.csv': 'at,title\n0,Drum shaft\n3:05,"Bearings, housings"\n370,Gussets\n',
  'two.csv': 'at,title\n0,Drum shaft\n3:05,Gussets\n',
  'falling.csv': 'at,title\n0,a\n100,b\n50,c\n',
  'wrong.csv': 'at,title\nsoon,a\n',
  'empty.csv': 'at,title\n',
  'list.edl':
    '001 AX V C 00:00:31:05 00:00:33:05 01:00:00:00 01:00:02:00\n* FROM CLIP NAME: C0043\n' +
    '002 C0044 V C 00:00:00:00 00:00:01:23 01:00:02:00 01:00:03:00\nM2 C0044 047.6 00:00:00:00\n',
  'notes.csv': 'id,clip,time\nn1,C0043,00:00:32:05\nn2,C0044.MP4,0.4\nn3,C0043,34\nn4,C0045,1\n',
  'bare.csv': 'n1,C0043,31.2\n',
  'bad.csv': 'id,clip,time\nn1,C0043,00:00:31:25\n',
  'few.csv': 'id,time\nn1,1\n',
  'parts.csv': 'number,name,aliases\nK03,tiller,stick; helm\n118,"bearing, housing",\n',
  'bare-parts.csv': 'K03,tiller\n',
  'said.vtt':
    'WEBVTT\n\n00:01.000 --> 00:03.000\nkay oh three is twelve mil\n\n00:03.000 --> 00:05.000\nwelded with sixty thirteens\n',
  'sound.edl': '1 C0043 V C 0 50 0 50\n2 C0044 A C 0 25 25 50\n',
};
const read = (path: string) => {
  const text = FILES[path];
  return text === undefined ? wrong(`The file ${path} cannot be read.`) : right(text);
};
const run = (...args: string[]) => runCommand(args, read);
const ask = (request: unknown) => answerLine(JSON.stringify(request));

describe('length', () => {
  // 1 in = 25.4 mm exactly: yard and pound agreement of 1959.
  it('prints both systems, and the shop fraction with its error', () => {
    expect(run('length', '1-1/2 in')).toEqual({
      ok: true,
      value: '{"mm":38.1,"in":1.5,"fraction":"1 1/2","fractionErrorMm":0}\n',
    });
  });

  it('rounds to the mark that is asked for', () => {
    expect(ask({ tool: 'length', text: '10 mm', nearest: 16 })).toMatchObject({
      value: { fraction: '3/8', fractionErrorMm: -0.475 },
    });
    expect(ask({ tool: 'length', text: '10 mm' })).toMatchObject({ value: { fraction: '25/64' } });
  });

  it('lists several sizes', () => {
    expect(ask({ tool: 'length', text: '40 x 3 mm' })).toMatchObject({
      value: { values: [{ mm: 40 }, { mm: 3 }] },
    });
  });
});

describe('timecode', () => {
  it.each([
    [['--rate', '30000/1001', '--drop', '1800'], '{"frame":1800,"timecode":"00:01:00;02","seconds":60.06}\n'],
    [['--rate', '29.97', '00:01:00;02'], '{"frame":1800,"timecode":"00:01:00;02","seconds":60.06}\n'],
    [['--rate', '25', '90'], '{"frame":90,"timecode":"00:00:03:15","seconds":3.6}\n'],
  ])('%j', (args, printed) => {
    expect(run('timecode', ...args)).toEqual({ ok: true, value: printed });
  });

  it('answers a batch by the same names', () => {
    expect(ask({ tool: 'timecode', rate: '30000/1001', drop: true, timecode: '00:01:00;02' })).toEqual({
      ok: true,
      value: { frame: 1800, timecode: '00:01:00;02', seconds: 60.06 },
    });
    expect(ask({ tool: 'timecode', rate: 25, frame: 90 })).toMatchObject({
      value: { timecode: '00:00:03:15' },
    });
  });
});

describe('edit', () => {
  const SEGMENTS = [
    { clip: 'C0043', source: [780, 830], record: [0, 50], speed: [1, 1] },
    { clip: 'C0044', source: [0, 48], record: [50, 75], speed: [238, 125] }, // 47.6 / 25
  ];

  it('prints the segments with their frames and speeds', () => {
    expect(run('edit', '--fps', '25', 'list.edl')).toEqual({
      ok: true,
      value: `${JSON.stringify({ rate: [25, 1], frames: 75, segments: SEGMENTS, warnings: [] })}\n`,
    });
  });

  it('counts a clip at a rate of its own', () => {
    const answer = run('edit', '--fps', '25', '--clip-fps', 'C0043=50', '--clip-fps', 'x=y=24', 'list.edl');
    expect(JSON.parse(answer.ok ? answer.value : '')).toMatchObject({
      segments: [{ source: [1555, 1655] }, {}],
    });
  });

  it('lists sound that is not that of the pictures', () => {
    const answer = run('edit', '--fps', '25', 'sound.edl');
    expect(JSON.parse(answer.ok ? answer.value : '')).toMatchObject({
      segments: [{ clip: 'C0043' }],
      sound: [{ clip: 'C0044', record: [25, 50] }],
    });
  });

  it('takes the list itself in a batch, or a timeline', () => {
    expect(ask({ tool: 'edit', edl: FILES['list.edl'], fps: 25 })).toMatchObject({
      value: { segments: SEGMENTS },
    });
    const time = (value: number) => ({ OTIO_SCHEMA: 'RationalTime.1', value, rate: 24 });
    const source_range = { OTIO_SCHEMA: 'TimeRange.1', start_time: time(12), duration: time(24) };
    const clip = { OTIO_SCHEMA: 'Clip.2', name: 'C0043', source_range };
    const tracks = {
      OTIO_SCHEMA: 'Stack.1',
      children: [{ OTIO_SCHEMA: 'Track.1', kind: 'Video', children: [clip] }],
    };
    const otio = { OTIO_SCHEMA: 'Timeline.1', name: 'Press', tracks };
    const value = {
      rate: [24, 1],
      frames: 24,
      segments: [{ clip: 'C0043', source: [12, 36], record: [0, 24], speed: [1, 1] }],
    };
    expect(ask({ tool: 'edit', otio: JSON.stringify(otio) })).toMatchObject({ value });
    expect(ask({ tool: 'edit', otio, fps: 24 })).toMatchObject({ value });
  });
});

describe('place', () => {
  const place = (list: string) => run('place', '--edit', 'list.edl', '--fps', '25', list);

  it('prints where notes come in the episode, in seconds', () => {
    const notes = [
      { id: 'n1', status: 'placed', at: [1] },
      { id: 'n2', status: 'placed', at: [2 + 0.4 / 1.904] }, // 47.6 / 25 of its speed
      { id: 'n3', status: 'snapped', at: [1.96] },
      { id: 'n4', status: 'lost', at: [] },
    ];
    expect(place('notes.csv')).toEqual({ ok: true, value: `${JSON.stringify({ notes })}\n` });
  });

  it('needs no names over the columns', () => {
    expect(place('bare.csv')).toMatchObject({
      value: '{"notes":[{"id":"n1","status":"placed","at":[0]}]}\n',
    });
  });

  it('takes rows in a batch, and labels at the clip’s own rate', () => {
    const notes = [
      { id: 7, clip: 'C0043', time: '00:00:31:10' },
      { id: 'b', clip: 'C0044', time: 0 },
    ];
    const request = { tool: 'place', edl: FILES['list.edl'], fps: 25, 'clip-fps': 'C0043=50', notes };
    expect(ask(request)).toEqual({
      ok: true,
      value: {
        notes: [
          { id: 7, status: 'placed', at: [0.1] },
          { id: 'b', status: 'placed', at: [2] },
        ],
      },
    });
  });

  it('reads the labels of a list that drops as it does', () => {
    const edl = 'FCM: DROP FRAME\n1 C0043 V C 00:00:59:29 00:01:00:04 00:00:00:00 00:00:00:03';
    const notes = [{ id: 1, clip: 'C0043', time: '00:01:00:02' }];
    // OpenTimelineIO, tests/test_opentime.py: 00:01:00;02 is the frame after 00:00:59;29.
    expect(ask({ tool: 'place', edl, fps: '30000/1001', notes })).toMatchObject({
      value: { notes: [{ at: [1001 / 30000] }] },
    });
  });
});

describe('chapters', () => {
  const at = (form: string, path = 'chapters.csv') => run('chapters', '--to', form, '--length', '848', path);

  it('prints the document in its own form', () => {
    expect(at('text')).toEqual({
      ok: true,
      value: '0:00 Drum shaft\n3:05 Bearings, housings\n6:10 Gussets\n',
    });
    expect(at('vtt')).toMatchObject({
      value: expect.stringMatching(/^WEBVTT\n\n00:00:00\.000 --> 00:03:05\.000\n/),
    });
    expect(at('ffmetadata')).toMatchObject({
      value: expect.stringMatching(/^;FFMETADATA1\n\[CHAPTER\]\nTIMEBASE=1\/1000\n/),
    });
    expect(at('podlove')).toMatchObject({ value: expect.stringMatching(/^<psc:chapters version="1\.2"/) });
  });

  it('prints JSON as one line', () => {
    const answer = at('json');
    expect(JSON.parse(answer.ok ? answer.value : '')).toMatchObject({
      version: '1.2.0',
      chapters: [{ startTime: 0 }, { startTime: 185 }, { startTime: 370 }],
    });
  });

  it('keeps what a video host would not show from its text only', () => {
    expect(at('text', 'two.csv')).toMatchObject({ ok: false });
    expect(at('json', 'two.csv')).toMatchObject({ ok: true });
  });

  it('takes rows in a batch', () => {
    const chapters = [{ at: 0, title: 'a' }, ['0:20', 'b'], ['40', 'c']];
    expect(ask({ tool: 'chapters', to: 'text', length: 60, chapters })).toEqual({
      ok: true,
      value: { text: '0:00 a\n0:20 b\n0:40 c\n' },
    });
  });
});

describe('Wrong input', () => {
  it.each([
    [[], 'Say which tool'],
    [['measure'], 'There is no tool measure'],
    [['length'], 'Give a size'],
    [['length', '12'], 'has no unit'],
    [['length', '1 in', '--nearest', '7'], 'nearest 16, 32 or 64'],
    [['length', '--loud', '1 in'], 'not understood'],
    [['timecode', '1800'], 'Give the rate'],
    [['timecode', '--rate', 'fast', '1800'], 'no frame rate'],
    [['timecode', '--rate', '25', '--drop', '5'], 'Drop-frame labels are for'],
    [['timecode', '--rate', '12/7', '5'], 'whole frames a second'],
    [['timecode', '--rate', '25', '1', '2'], 'one frame or timecode'],
    [['timecode', '--rate', '30000/1001', '00:01:00;00'], 'does not exist'],
    [['edit', '--fps', '25'], 'Give one edit list'],
    [['edit', 'list.edl'], 'does not say its rate'],
    [['edit', '--fps', '24000', 'lost.edl'], 'cannot be read'],
    [['edit', '--fps', '20', 'list.edl'], 'Line 3: 00:00:01:23 has frames beyond 19'],
    [['edit', '--fps', '25', '--clip-fps', 'C0043', 'list.edl'], 'NAME=RATE'],
    [['edit', '--fps', '25', '--clip-fps', 'C0043=fast', 'list.edl'], 'no frame rate'],
    [['edit', '--fps', '25', 'two.csv'], 'no event in this list'],
    [['place', '--fps', '25', 'notes.csv'], 'Say which edit'],
    [['place', '--edit', 'list.edl', '--fps', '25'], 'Give one list of notes'],
    [['place', '--edit', 'list.edl', '--fps', '25', 'bad.csv'], 'Line 2: 00:00:31:25 has frames beyond 24'],
    [['place', '--edit', 'list.edl', '--fps', '25', 'few.csv'], 'needs the columns id, clip and time'],
    [['place', '--edit', 'two.csv', '--fps', '25', 'notes.csv'], 'no event in this list'],
    [['chapters', '--to', 'text'], 'Give one list'],
    [['chapters', '--to', 'opera', 'chapters.csv'], 'Choose a form'],
    [['chapters', '--to', 'vtt', 'chapters.csv'], 'Give the length'],
    [['chapters', '--to', 'json', 'lost.csv'], 'cannot be read'],
    [['chapters', '--to', 'json', 'falling.csv'], 'not after the chapter before'],
    [['chapters', '--to', 'json', 'wrong.csv'], 'is no time'],
    [['chapters', '--to', 'json', 'empty.csv'], 'no chapters in the list'],
    [['chapters', '--to', 'json', '--length', '100', 'chapters.csv'], 'after the video has ended'],
  ])('%j gets a sentence', (args, sentence) => {
    const answer = run(...args);
    expect(answer.ok ? '' : answer.error).toContain(sentence);
    expect(answer.ok ? '' : answer.error).not.toContain('\n');
  });

  it.each([
    ['', 'no JSON object'],
    ['[]', 'no JSON object'],
    ['{"tool":7}', 'Say which tool'],
    ['{"tool":"toString"}', 'no tool toString'],
    ['{"tool":"length"}', 'Give the size as text'],
    ['{"tool":"timecode","rate":25}', 'either a frame or a timecode'],
    ['{"tool":"timecode","rate":25,"frame":1,"timecode":"00:00:00:01"}', 'either a frame or a timecode'],
    ['{"tool":"timecode","rate":25,"frame":-1}', 'not below zero'],
    ['{"tool":"chapters","to":"json","chapters":7}', 'Give the chapters'],
    ['{"tool":"place","fps":25,"edl":"1 A V C 0 5 0 5"}', 'Give the notes as a list'],
    [
      '{"tool":"place","fps":25,"edl":"1 A V C 0 5 0 5","notes":[{"id":1,"clip":"A","time":-1}]}',
      'Note 1: -1 is no time',
    ],
    [
      '{"tool":"place","fps":25,"edl":"1 A V C 0 5 0 5","notes":[{"id":1,"clip":"","time":1}]}',
      'has no clip',
    ],
    ['{"tool":"edit","fps":25}', 'one edit list or one timeline'],
    ['{"tool":"edit","fps":25,"otio":"{\\"OTIO_SCHEMA\\":"}', 'Line 1: the timeline is no JSON'],
    ['{"tool":"edit","edl":7}', 'An edit list is text'],
  ])('in a batch, %s gets a sentence', (line, sentence) => {
    const answer = answerLine(line);
    expect(answer.ok ? '' : answer.error).toContain(sentence);
  });
});

describe('captions', () => {
  const findings = [
    { cue: 1, kind: 'part', part: 'K03', text: 'kay oh three' },
    { cue: 1, kind: 'size', part: 'K03', text: 'twelve mil', values: [{ value: 12, unit: 'mm' }] },
    { cue: 2, kind: 'setting', what: 'electrode', text: 'E6013', words: 'sixty thirteens' },
  ];

  it('prints how many captions there are and what was found, with seconds', () => {
    const answer = run('captions', '--parts', 'parts.csv', 'said.vtt');
    if (!answer.ok) throw new Error(answer.error);
    const printed = JSON.parse(answer.value) as { findings: { from: number; to: number }[] };
    expect(printed).toMatchObject({ cues: 2, findings });
    for (const { from, to } of printed.findings) {
      expect(from).toBeGreaterThanOrEqual(1);
      expect(to).toBeGreaterThan(from);
      expect(to).toBeLessThanOrEqual(5);
    }
  });

  it('answers a batch with the captions and the parts in fields', () => {
    const parts = [{ number: 'K03', name: 'tiller', aliases: ['stick'] }];
    expect(ask({ tool: 'captions', captions: FILES['said.vtt'], parts })).toMatchObject({
      ok: true,
      value: { cues: 2, findings },
    });
  });

  it('takes the dialect of the maker', () => {
    const asked = { tool: 'captions', captions: FILES['said.vtt'], parts: [], mil: 'thou' };
    expect(ask(asked)).toMatchObject({
      value: { findings: [{ values: [{ value: 12, unit: 'thou' }] }, {}] },
    });
  });

  it.each([
    [['captions', 'said.vtt'], 'Say which parts with --parts.'],
    [
      ['captions', '--parts', 'bare-parts.csv', 'said.vtt'],
      'The list of parts needs the columns number and name',
    ],
    [['captions', '--parts', 'parts.csv', 'parts.csv'], 'This is not a captions file'],
    [['captions', '--parts', 'parts.csv', 'gone.vtt'], 'The file gone.vtt cannot be read.'],
  ])('%j says what is wrong', (args, error) => {
    const answer = run(...args);
    expect(answer.ok ? '' : answer.error).toContain(error);
  });
});
