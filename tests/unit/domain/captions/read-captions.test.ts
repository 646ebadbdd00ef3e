import { describe, expect, it } from 'vitest';
import { CAPTIONS_LIMITS } from '../../../../src/domain/captions/cue.ts';
import {
  type Captions,
  readCaptions,
  readCaptionsText,
} from '../../../../src/domain/captions/read-captions.ts';
import { sniffCaptions } from '../../../../src/domain/captions/sniff-captions.ts';

function read(text: string): Captions {
  const answer = readCaptionsText(text);
  if (!answer.ok) throw new Error(answer.error);
  return answer.value;
}

function refusal(text: string): string {
  const answer = readCaptionsText(text);
  return answer.ok ? '' : answer.error;
}

const vtt = (...blocks: string[]) => ['WEBVTT', ...blocks].join('\n\n');
const timed = (times: string, words = 'so with the shaft done') => `${times}\n${words}`;

describe('WebVTT', () => {
  it('is read with its words, in milliseconds', () => {
    expect(
      read(vtt(timed('00:03:34.100 --> 00:03:39.900', 'so with the shaft done\nwe can hang it'))),
    ).toEqual({
      format: 'webvtt',
      cues: [{ start: 214_100, end: 219_900, lines: ['so with the shaft done', 'we can hang it'] }],
      warnings: [],
    });
  });

  // W3C WebVTT, the file format; the shapes are those of the public file-parsing tests.
  it.each<[string, string, number]>([
    ['with a text after the signature', 'WEBVTT - drum shaft\n\n00:00.000 --> 00:01.000\na', 1],
    ['with lone carriage returns', 'WEBVTT\r\r00:00.000 --> 00:01.000\ra\r', 1],
    ['with CRLF', 'WEBVTT\r\n\r\n00:00.000 --> 00:01.000\r\na\r\n', 1],
    [
      'with minutes past 59 without hours',
      vtt(timed('60:00.000 --> 61:00.000'), timed('00:00.000 --> 00:01.000')),
      1,
    ],
    ['with 60 hours', vtt(timed('60:00:01.000 --> 60:00:02.000')), 1],
    [
      'with a vertical tab before the arrow',
      vtt(timed('00:00.000\v-->\t00:01.000'), timed('00:02.000 --> 00:03.000')),
      1,
    ],
    [
      'with notes and styles between',
      vtt('NOTE a remark', 'STYLE\n::cue{}', timed('00:00.000 --> 00:01.000')),
      1,
    ],
    ['with an arrow for an id', vtt('-->\n00:00.000 --> 00:01.000\na'), 1],
    [
      'with settings, right and wrong',
      vtt(timed('00:00.000 --> 00:01.000 line:101% align:middle size:50%')),
      1,
    ],
  ])('%s keeps the right captions', (_name, text, count) => {
    expect(read(text).cues).toHaveLength(count);
  });

  it('reads 60 hours as hours', () => {
    // The public test timings-60: 60:00:01.000 is 216 001 s.
    expect(read(vtt(timed('60:00:01.000 --> 60:00:02.000'))).cues[0]?.start).toBe(216_001_000);
  });

  it('gives plain words, and when they are spoken where the file says so', () => {
    const words = '<v Rosa><i>14&nbsp;or</i> 40 &amp; <00:00:00.500>a half &lt;3</v>';
    expect(read(vtt(timed('00:00.000 --> 00:01.000', words))).cues[0]).toEqual({
      start: 0,
      end: 1000,
      lines: ['14\u00a0or 40 & a half <3'],
      voice: 'Rosa',
      stamps: [{ character: 11, time: 500 }],
    });
  });

  it('places word times behind lines that are trimmed away', () => {
    const words = ' \n so<00:00:00.400><c> the</c><00:00:00.800><c> drum</c> \nnext<00:00:01.200><c> is</c>';
    expect(read(vtt(timed('00:00.000 --> 00:02.000', words))).cues[0]).toMatchObject({
      lines: ['so the drum', 'next is'],
      stamps: [
        { character: 3, time: 400 },
        { character: 7, time: 800 },
        { character: 17, time: 1200 },
      ],
    });
  });

  it('names nobody when two speak in one caption', () => {
    const cue = read(vtt(timed('00:00.000 --> 00:01.000', '<v Rosa>forty\n<v Ben>fourteen'))).cues[0];
    expect(cue).not.toHaveProperty('voice');
    expect(cue?.lines).toEqual(['forty', 'fourteen']);
  });

  it('turns NUL into the replacement character', () => {
    expect(read(vtt(timed('00:00.000 --> 00:01.000', 'a\0b'))).cues[0]?.lines).toEqual(['a\uFFFDb']);
  });

  it('sorts captions that stand out of order', () => {
    const text = vtt(timed('00:05.000 --> 00:06.000'), timed('00:01.000 --> 00:02.000'));
    expect(read(text).cues.map(({ start }) => start)).toEqual([1000, 5000]);
  });

  it('leaves out captions that end before they begin, and says so', () => {
    const text = vtt(
      timed('00:01.000 --> 00:00.999'),
      timed('00:02.000 --> 00:02.000'),
      timed('00:03.000 --> 00:04.000'),
    );
    expect(read(text)).toMatchObject({
      cues: [{ start: 3000 }],
      warnings: ['2 captions ended before they began and were left out.'],
    });
  });
});

describe('SubRip', () => {
  it('is read to the millisecond', () => {
    // The Matroska specification's subtitles.md; the durations are computed.
    const text = '1\n00:02:17,440 --> 00:02:20,375\nSenator\n\n2\n00:02:20,476 --> 00:02:22,501\nyes\n';
    expect(read(text).cues.map(({ start, end }) => [start, end - start])).toEqual([
      [137_440, 2935],
      [140_476, 2025],
    ]);
  });

  // Common practice: files in the wild have all of these.
  it.each<[string, string, string[][]]>([
    ['a full stop for the comma', '1\n00:00:01.000 --> 00:00:02.000\na', [['a']]],
    ['CRLF', '1\r\n00:00:01,000 --> 00:00:02,000\r\na\r\n\r\n', [['a']]],
    ['no numbers', '00:00:01,000 --> 00:00:02,000\na\n\n00:00:03,000 --> 00:00:04,000\nb', [['a'], ['b']]],
    [
      'wrong numbers',
      '7\n00:00:01,000 --> 00:00:02,000\na\n\n7\n00:00:03,000 --> 00:00:04,000\nb',
      [['a'], ['b']],
    ],
    [
      'several blank lines',
      '1\n00:00:01,000 --> 00:00:02,000\na\n\n\n\n2\n00:00:03,000 --> 00:00:04,000\nb',
      [['a'], ['b']],
    ],
    [
      'no blank line before the next',
      '1\n00:00:01,000 --> 00:00:02,000\na\n2\n00:00:03,000 --> 00:00:04,000\nb',
      [['a'], ['b']],
    ],
    ['coordinates', '1\n00:00:01,000 --> 00:00:02,000 X1:40 X2:600 Y1:20 Y2:50\na', [['a']]],
    [
      'tags',
      '1\n00:00:01,000 --> 00:00:02,000\n{\\an8}<b>a</b> <font color="#fff">b</font> <i>c</i>',
      [['a b c']],
    ],
    [
      'a comparison that is no tag',
      '1\n00:00:01,000 --> 00:00:02,000\nif 3 < 4 and 5 > 2',
      [['if 3 < 4 and 5 > 2']],
    ],
    [
      'a blank line inside',
      '1\n00:00:01,000 --> 00:00:02,000\na\n\nb\n\n2\n00:00:03,000 --> 00:00:04,000\nc',
      [['a', 'b'], ['c']],
    ],
    ['one-digit hours and short milliseconds', '1\n0:00:01,5 --> 0:00:02,25\na', [['a']]],
  ])('is tolerated with %s', (_name, text, lines) => {
    expect(read(text)).toMatchObject({ format: 'subrip', cues: lines.map((words) => ({ lines: words })) });
  });

  it('keeps a line that is a number and not the next caption’s', () => {
    const text = '1\n00:00:01,000 --> 00:00:02,000\n118\n\n2\n00:00:03,000 --> 00:00:04,000\nb';
    expect(read(text).cues[0]?.lines).toEqual(['118']);
  });
});

describe('Bytes', () => {
  const text = 'WEBVTT\n\n00:00.000 --> 00:01.000\n35 mm für die Möhre\n';
  const utf8 = new TextEncoder().encode(text);
  const wide = (order: 'le' | 'be', mark: boolean) => {
    const units = [...(mark ? '\uFEFF' : ''), ...text].map((character) => character.charCodeAt(0));
    return new Uint8Array(
      units.flatMap((unit) => (order === 'le' ? [unit & 255, unit >> 8] : [unit >> 8, unit & 255])),
    );
  };

  it.each<[string, Uint8Array]>([
    ['UTF-8', utf8],
    ['UTF-8 with a mark', new Uint8Array([0xef, 0xbb, 0xbf, ...utf8])],
    ['UTF-16, low byte first, with a mark', wide('le', true)],
    ['UTF-16, high byte first, with a mark', wide('be', true)],
    ['UTF-16, low byte first, without', wide('le', false)],
    ['UTF-16, high byte first, without', wide('be', false)],
  ])('of %s are read without a word', (_name, bytes) => {
    expect(readCaptions(bytes)).toMatchObject({
      ok: true,
      value: { cues: [{ lines: ['35 mm für die Möhre'] }], warnings: [] },
    });
  });

  it('that are no UTF-8 are read as Windows-1252, and the guess is told', () => {
    // WHATWG Encoding, index windows-1252: 0x93 and 0x94 are quotation marks, 0x80 the euro sign.
    const bytes = new Uint8Array([
      ...new TextEncoder().encode('WEBVTT\n\n00:00.000 --> 00:01.000\n'),
      0x93,
      0xfc,
      0x94,
      0x80,
    ]);
    const answer = readCaptions(bytes);
    expect(answer).toMatchObject({ ok: true, value: { cues: [{ lines: ['“ü”€'] }] } });
    expect(answer.ok && answer.value.warnings[0]).toContain('Windows-1252');
  });

  it('too many are refused before they are read', () => {
    expect(readCaptions(new Uint8Array(CAPTIONS_LIMITS.bytes + 1))).toMatchObject({ ok: false });
  });
});

describe('What is no captions file', () => {
  it.each([
    ['', 'empty'],
    [' \n\n', 'empty'],
    // The public tests signature-invalid: each is refused.
    ['WEBVTTX\n\n00:00.000 --> 00:01.000\na', 'This is not a captions file'],
    ['WEBV\n\n00:00.000 --> 00:01.000\na', 'This is not a captions file'],
    ['webvtt\n\n00:00.000 --> 00:01.000\na', 'This is not a captions file'],
    [' WEBVTT\n\n00:00.000 --> 00:01.000\na', 'This is not a captions file'],
    ['number,name\n101,base rail\n', 'This is not a captions file'],
    ['\u0000\u0001\u0002PNG', 'This is not a captions file'],
    ['WEBVTT', 'no captions in this file'],
    [vtt(timed('00:00.000 --> 00:01.000', '<b></b>')), 'no captions in this file'],
  ])('%j is refused with a sentence', (text, sentence) => {
    expect(refusal(text)).toContain(sentence);
    expect(refusal(text)).toMatch(/\.$/);
  });

  it('is one with more captions than anyone speaks', () => {
    const block = '00:00.000 --> 00:01.000\na\n\n';
    expect(refusal(`WEBVTT\n\n${block.repeat(CAPTIONS_LIMITS.cues + 1)}`)).toContain('20001 captions');
  });

  it('is one with a caption that is a book', () => {
    expect(refusal(vtt(timed('03:40.000 --> 03:41.000', 'a'.repeat(2001))))).toContain('The caption at 3:40');
  });
});

describe('sniffCaptions', () => {
  it('goes by the content', () => {
    expect(sniffCaptions('WEBVTT\n1\n00:00:01,000 --> 00:00:02,000')).toBe('webvtt');
    expect(sniffCaptions('WEBVTT\ttitle')).toBe('webvtt');
    expect(sniffCaptions('1\n00:00:01,000 --> 00:00:02,000\na')).toBe('subrip');
    expect(sniffCaptions('00:00:01:00 00:00:02:00')).toBeNull();
  });
});
