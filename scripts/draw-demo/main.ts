import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { CLIP } from './clip.ts';
import { drawStill, makeFilm, timesOf } from './film.ts';
import { layOutLettering } from './lettering.ts';
import { makePhotos } from './photos.ts';
import { PRESS_1 } from './press-1.ts';
import { PRESS_3 } from './press-3.ts';
import { PRESS_4 } from './press-4.ts';

// Run by hand; what it makes is kept in src/seed/media.
//   npm run draw-demo                  everything
//   npm run draw-demo -- NAME          one film, such as press-4, or the photos
//   npm run draw-demo -- NAME SECONDS… pictures of it into the folder DRAWN, or its captions when no second is named
const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const OUTPUT = join(ROOT, 'src/seed/media');
const FILMS = { 'press-1': PRESS_1, 'press-3': PRESS_3, 'press-4': PRESS_4, clip: CLIP };

async function main(): Promise<void> {
  const [name, ...seconds] = process.argv.slice(2);
  const work = mkdtempSync(join(tmpdir(), 'draw-demo-'));
  try {
    layOutLettering(ROOT, join(work, 'lettering'));
    if ((name ?? 'photos') === 'photos') await makePhotos(OUTPUT);
    const chosen = Object.entries(FILMS).filter(([key]) => name === undefined || key === name);
    for (const [key, film] of chosen) {
      const stills = process.env['DRAWN'];
      if (stills === undefined) await makeFilm(film, OUTPUT, work);
      else {
        mkdirSync(stills, { recursive: true });
        writeFileSync(join(stills, `${key}.vtt`), timesOf(film, work));
        for (const at of seconds)
          writeFileSync(join(stills, `${key}-${at}.png`), await drawStill(film, Number(at), work));
      }
    }
  } finally {
    rmSync(work, { recursive: true });
  }
}

await main();
