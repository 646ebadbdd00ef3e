import { describe, expect, it } from 'vitest';
import { attachment } from '../../../src/server/storage/storage-objects.ts';
import { amendPolicy, storageSources } from '../../../src/server/http/content-policy.ts';
import { readRange } from '../../../src/server/http/media-answer.ts';
import { readExifTime } from '../../../src/server/media/read-exif.ts';
import { RefusedFile } from '../../../src/server/media/refused-file.ts';
import { sniffFile } from '../../../src/server/media/sniff-file.ts';
import { stripJpeg } from '../../../src/server/media/strip-jpeg.ts';

const bytes = (text: string) => Buffer.from(text, 'latin1');

describe('A file by its first bytes', () => {
  it.each([
    ['\xff\xd8\xff\xe0', 'photo', 'jpeg'],
    ['\x89PNG\r\n\x1a\n', 'photo', 'png'],
    ['RIFF\0\0\0\0WEBPVP8 ', 'photo', 'webp'],
    ['\0\0\0\x18ftypheic', 'photo', 'heic'],
    ['\0\0\0\x14ftypqt  ', 'media', 'mov'],
    ['\0\0\0\x14ftypM4A ', 'media', 'mov'],
    ['\0\0\0\x08wide\0\0\0\0mdat', 'media', 'mov'],
    ['\x1a\x45\xdf\xa3', 'media', 'matroska'],
    ['RIFF\0\0\0\0WAVEfmt ', 'media', 'wav'],
    ['RF64\0\0\0\0WAVEds64', 'media', 'wav'],
    ['ID3\x04', 'media', 'mp3'],
    ['\xff\xfb\x90\x64', 'media', 'mp3'],
    ['%PDF-1.7', 'document', 'pdf'],
  ])('%j is %s, %s, whatever it is called', (head, kind, format) => {
    expect(sniffFile(bytes(head), 'notes.csv')).toEqual({ kind, format });
  });

  it.each([
    ['\0\0\0\x18ftypavif', 'a.heic'],
    [' %PDF-1.7', 'a.pdf'],
    ['\xef\xbb\xbf<!DOCTYPE html>', 'a.csv'],
    ['\n <svg>', 'a.csv'],
    ['a,b\0c', 'a.csv'],
    ['PK\x03\x04', 'a.pdf'],
    ['just words', 'a.txt'],
    ['', 'a.mp4'],
  ])('%j called %s is not taken', (head, name) => {
    expect(() => sniffFile(bytes(head), name)).toThrow(RefusedFile);
  });
});

describe('The time in a photo', () => {
  it('is not read past the end of its block', () => {
    expect(readExifTime(bytes('Exif\0\0II*\0\x08\0\0\0\xff\xff'))).toBeNull();
    expect(readExifTime(bytes('II*\0\xff\xff\xff\x7f'))).toBeNull();
    expect(readExifTime(bytes('nothing'))).toBeNull();
  });
});

describe('A JPEG inside a PDF', () => {
  it('loses its notes and keeps its picture and colours', () => {
    const segment = (marker: number, text: string) =>
      Buffer.concat([Buffer.from([0xff, marker, 0, text.length + 2]), bytes(text)]);
    const picture = Buffer.concat([segment(0xda, 'x'), bytes('pixels\xff\xd9')]);
    const [colours, head] = [segment(0xe2, 'ICC'), bytes('\xff\xd8')];
    const notes = [segment(0xe1, 'Exif GPS'), segment(0xfe, 'made in the shed'), segment(0xed, 'IPTC')];
    const stripped = stripJpeg(Buffer.concat([head, ...notes, colours, picture]));
    expect(Buffer.from(stripped)).toEqual(Buffer.concat([head, colours, picture]));
  });
});

describe('A range', () => {
  it.each([
    ['bytes=0-9', { first: 0, last: 9 }],
    ['bytes=90-', { first: 90, last: 99 }],
    ['bytes=-10', { first: 90, last: 99 }],
    ['bytes=-500', { first: 0, last: 99 }],
    ['bytes=95-200', { first: 95, last: 99 }],
    ['bytes=100-', 'unsatisfiable'],
    ['bytes=-0', 'unsatisfiable'],
    ['bytes=9-0', null],
    ['bytes=0-1,5-6', null],
    ['lines=1-2', null],
    [null, null],
  ])('%s of 100 bytes', (header, range) => {
    expect(readRange(header, 100)).toEqual(range);
  });
});

describe('The policy of a page', () => {
  it('lets in the storage beside what was there', () => {
    const policy = "default-src 'self'; object-src 'none'; img-src 'self' data:; script-src 'sha256-abc';";
    expect(amendPolicy(policy, storageSources('https://media.example/bucket'))).toBe(
      "default-src 'self'; object-src 'none'; img-src 'self' data: https://media.example; script-src 'sha256-abc'; connect-src 'self' https://media.example; media-src 'self' https://media.example",
    );
  });

  it("drops 'none' where something is let in", () => {
    expect(amendPolicy("frame-src 'none'", { 'frame-src': ['https://video.example'] })).toBe(
      'frame-src https://video.example',
    );
  });
});

describe('What a file is saved as', () => {
  it('is its own name, and a plain one for old browsers', () => {
    expect(attachment('Wälle "A"\r\n.pdf')).toBe(
      `attachment; filename="W_lle _A___.pdf"; filename*=UTF-8''W%C3%A4lle%20%22A%22%0D%0A.pdf`,
    );
  });
});
