import { XMLParser } from 'fast-xml-parser';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import webvtt from 'webvtt-parser';
import {
  toJsonChapters,
  writeChapterText,
  writeChapterVtt,
  writeFfmetadata,
  writePodloveChapters,
} from '../../../../src/domain/chapters/write-chapters.ts';
import { parseClock } from '../../../../src/domain/time/parse-clock.ts';

const CHAPTERS = [
  { start: 0, title: 'Drum shaft' },
  { start: 187_000, title: 'Bearing housings' },
  { start: 506_250, title: 'Cylinder & ports' },
  { start: 3_600_000, title: 'Drip tray' },
];
const LENGTH = 3_700_000;

describe('writeChapterText', () => {
  it('writes hours from the first one on, whole seconds, one line each', () => {
    expect(writeChapterText([...CHAPTERS, { start: 3_599_000, title: ' two\nlines ' }])).toBe(
      '0:00 Drum shaft\n3:07 Bearing housings\n8:26 Cylinder & ports\n1:00:00 Drip tray\n59:59 two lines\n',
    );
  });
});

describe('writeChapterVtt', () => {
  it('is a track without fault: one chapter ends where the next begins', () => {
    const { cues, errors } = new webvtt.WebVTTParser().parse(writeChapterVtt(CHAPTERS, LENGTH), 'chapters');
    expect(errors).toEqual([]);
    expect(cues.map(({ startTime, endTime }) => [startTime, endTime])).toEqual([
      [0, 187],
      [187, 506.25],
      [506.25, 3600],
      [3600, 3700],
    ]);
  });

  it('keeps any title harmless', () => {
    const text = writeChapterVtt([{ start: 0, title: 'a --> b <i> & c' }], 1000);
    expect(text).toBe('WEBVTT\n\n00:00:00.000 --> 00:00:01.000\na → b &lt;i&gt; &amp; c\n');
  });
});

describe('toJsonChapters', () => {
  it('has the version and starts in seconds (Podcasting 2.0 chapters 1.2)', () => {
    expect(toJsonChapters(CHAPTERS.slice(1, 3))).toEqual({
      version: '1.2.0',
      chapters: [
        { startTime: 187, title: 'Bearing housings' },
        { startTime: 506.25, title: 'Cylinder & ports' },
      ],
    });
  });
});

describe('writeFfmetadata', () => {
  it('says its time base, without which numbers are nanoseconds', () => {
    expect(writeFfmetadata(CHAPTERS.slice(0, 1), 60_000)).toBe(
      ';FFMETADATA1\n[CHAPTER]\nTIMEBASE=1/1000\nSTART=0\nEND=60000\ntitle=Drum shaft\n',
    );
  });

  it.each([
    // FFmpeg, doc/metadata.texi: the text on the right decodes to the title on the left.
    ['bike\\shed', 'title=bike\\\\shed'],
    ['chapter #1', 'title=chapter \\#1'],
    ['a=b;c', 'title=a\\=b\\;c'],
  ])('escapes %s', (title, line) => {
    expect(writeFfmetadata([{ start: 0, title }], 1000).split('\n')).toContain(line);
  });

  it('comes back when it is unescaped', () => {
    fc.assert(
      fc.property(fc.string({ minLength: 1 }), (title) => {
        const plain = title.replace(/\s+/gu, ' ').trim();
        const written = writeFfmetadata([{ start: 0, title }], 1000).split('title=')[1] ?? '';
        expect(written.slice(0, -1).replace(/\\(.)/gsu, '$1')).toBe(plain);
      }),
    );
  });
});

describe('writePodloveChapters', () => {
  const parser = new XMLParser({ ignoreAttributes: false, attributeNamePrefix: '' });

  it('is XML with the starts of the sample (Podlove Simple Chapters 1.2)', () => {
    const { 'psc:chapters': read } = parser.parse(writePodloveChapters(CHAPTERS)) as {
      'psc:chapters': { version: string; 'psc:chapter': { start: string; title: string }[] };
    };
    expect(read.version).toBe('1.2');
    expect(read['psc:chapter'].map(({ start }) => parseClock(start))).toEqual(
      [0, 187, 506.25, 3600].map((value) => ({ ok: true, value })),
    );
    expect(read['psc:chapter'][2]?.title).toBe('Cylinder & ports');
  });

  it('lets no title out of its attribute', () => {
    expect(writePodloveChapters([{ start: 0, title: '"/><x a="\u0001' }])).toContain(
      'title="&quot;/&gt;&lt;x a=&quot;"/>',
    );
  });
});
