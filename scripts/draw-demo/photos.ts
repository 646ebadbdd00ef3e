import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import {
  box,
  centrePop,
  dimension,
  disc,
  group,
  label,
  line,
  picture,
  push,
  seen,
  shape,
  words,
} from './drawing.ts';
import { guard } from './clip.ts';
import { drumEnd, press } from './machine.ts';
import { slotNumbers } from './press-3.ts';
import { twoThreads } from './press-4.ts';

/** A photo of the diary: a drawing, with the time at which it was taken by the camera's clock. */
interface Photo {
  readonly file: string;
  readonly taken: string;
  readonly draw: () => string;
}

const SIZE = { ground: 'sheet', width: 1280, height: 960 } as const;
const LOWER = 'translate(0 108)';

function squareFrame(): string {
  const [x, y, zoom] = [0, -800, 0.5];
  const at = (px: number, py: number) => `${String(640 + (px - x) * zoom)} ${String(372 + (py - y) * zoom)}`;
  return group(
    [
      seen(press({ withRam: false, withStack: false }), x, y, zoom),
      line(`M${at(-370, -110)}L${at(370, -1560)}`, 'mark', 'stroke-dasharray="12 7"'),
      line(`M${at(370, -110)}L${at(-370, -1560)}`, 'mark', 'stroke-dasharray="12 7"'),
      push(320, -70, 448, -22),
      push(960, 790, 832, 742),
      label(300, 320, '1629', 'brass'),
      label(880, 320, '1627', 'dye'),
      words(975, 770, 'pull the long one in', { size: 24, kind: 'faint' }),
    ].join(''),
    { move: LOWER },
  );
}

function rackFromAbove(): string {
  const slats = Array.from({ length: 10 }, (_none, index) => {
    const x = -234 + index * 48;
    const grain = [8, 17, 27]
      .map((off) => `M${String(x + off)} -226q${String((index % 3) - 1)} 220 0 452`)
      .join('');
    return box(x, -230, 36, 460, 'board') + line(grain, 'soft', 'stroke="#8a6a3d" stroke-opacity="0.4"');
  });
  const frame = [-180, 0, 180].map((y) => box(-235, y - 14, 470, 28, 'wood')).join('');
  const pegs = [-180, 0, 180].flatMap((y) =>
    Array.from({ length: 10 }, (_none, index) => disc(-216 + index * 48, y, 4.5, '#6e5128')),
  );
  return [
    group([frame, ...slats, ...pegs].join(''), { move: 'translate(640 470) scale(1.5)' }),
    dimension(288, 876, 993, 876, '470 mm', { from: -60 }),
    dimension(1078, 125, 1078, 815, '460 mm', { from: -70 }),
    line('M343 92v20M361 92v20M300 102h43M404 102h-43', 'ink'),
    words(415, 110, '12 mm between slats', { size: 24 }),
  ].join('');
}

function drumFromItsEnd(): string {
  return group(
    seen(drumEnd({ proud: 3, turned: 0 }), 0, 0, 3.9) +
      slotNumbers(640, 372, 258) +
      label(60, 40, '160.4 mm, 1 to 8', 'brass'),
    { move: LOWER },
  );
}

function portThreads(): string {
  return group(twoThreads(0), { move: LOWER });
}

function beltGuard(): string {
  return group(
    [
      shape('M0 690h1280v200H0z', 'board'),
      line('M0 760h1280M0 830h1280', 'soft'),
      group(guard(640, 350, 0), { move: 'translate(64 40) scale(0.9)' }),
      centrePop(640, 60, 14),
    ].join(''),
    { move: 'translate(0 70)' },
  );
}

const PHOTOS: readonly Photo[] = [
  { file: 'frame-square.jpg', taken: '2026:09:26 15:41:10', draw: squareFrame },
  { file: 'rack.jpg', taken: '2026:10:10 11:05:32', draw: rackFromAbove },
  { file: 'drum-end.jpg', taken: '2026:10:24 16:20:48', draw: drumFromItsEnd },
  { file: 'port-threads.jpg', taken: '2026:11:05 18:02:19', draw: portThreads },
  { file: 'belt-guard.jpg', taken: '2026:11:24 14:55:03', draw: beltGuard },
];

/** Draws the diary's photos, lit from above as on a bench. */
export async function makePhotos(output: string): Promise<void> {
  const { default: sharp } = await import('sharp');
  for (const { file, taken, draw } of PHOTOS) {
    const light = `<defs><radialGradient id="lamp" cx="0.42" cy="0.3" r="0.95"><stop offset="0.35" stop-color="#fff3d6" stop-opacity="0.16"/><stop offset="1" stop-color="#1a2024" stop-opacity="0.34"/></radialGradient></defs><rect width="1280" height="960" fill="url(#lamp)"/>`;
    const bytes = await sharp(Buffer.from(picture(SIZE, draw() + light)))
      .removeAlpha()
      .withExif({ IFD2: { DateTimeOriginal: taken } })
      .jpeg({ quality: 82, mozjpeg: true })
      .toBuffer();
    writeFileSync(join(output, file), bytes);
  }
}
