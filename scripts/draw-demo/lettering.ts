import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { inflateSync } from 'node:zlib';

const FACES = [
  'karla/files/karla-latin-500-normal.woff',
  'karla/files/karla-latin-700-normal.woff',
  'spline-sans-mono/files/spline-sans-mono-latin-500-normal.woff',
  'spline-sans-mono/files/spline-sans-mono-latin-600-normal.woff',
];

/** Lays out the product's own faces for the renderer, which asks fontconfig. Called before sharp is loaded. */
export function layOutLettering(root: string, folder: string): void {
  mkdirSync(folder, { recursive: true });
  for (const [index, face] of FACES.entries()) {
    const woff = readFileSync(join(root, 'node_modules/@fontsource', face));
    writeFileSync(join(folder, `face-${String(index)}.ttf`), unpackWoff(woff));
  }
  const config = join(folder, 'fonts.conf');
  writeFileSync(
    config,
    `<?xml version="1.0"?><fontconfig><dir>${folder}</dir><cachedir>${folder}/cache</cachedir></fontconfig>`,
  );
  process.env['FONTCONFIG_FILE'] = config;
}

/** The font inside a WOFF file (W3C, WOFF File Format 1.0, sections 3 to 5). */
function unpackWoff(woff: Buffer): Buffer {
  const count = woff.readUInt16BE(12);
  const head = Buffer.alloc(12 + 16 * count);
  woff.copy(head, 0, 4, 8);
  head.writeUInt16BE(count, 4);
  const power = 2 ** Math.floor(Math.log2(count));
  head.writeUInt16BE(power * 16, 6);
  head.writeUInt16BE(Math.log2(power), 8);
  head.writeUInt16BE((count - power) * 16, 10);
  const tables: Buffer[] = [];
  let at = head.length;
  for (let index = 0; index < count; index += 1) {
    const entry = 44 + 20 * index;
    const [offset, packed, length] = [4, 8, 12].map((skip) => woff.readUInt32BE(entry + skip)) as [
      number,
      number,
      number,
    ];
    const stored = woff.subarray(offset, offset + packed);
    const table = packed < length ? inflateSync(stored) : stored;
    woff.copy(head, 12 + 16 * index, entry, entry + 4);
    woff.copy(head, 16 + 16 * index, entry + 16, entry + 20);
    head.writeUInt32BE(at, 20 + 16 * index);
    head.writeUInt32BE(length, 24 + 16 * index);
    tables.push(table, Buffer.alloc((4 - (length % 4)) % 4));
    at += length + ((4 - (length % 4)) % 4);
  }
  return Buffer.concat([head, ...tables]);
}
