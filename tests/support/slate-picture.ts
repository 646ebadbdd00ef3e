import { encode } from 'uqr';

/** A picture of a code on a white card before a grey wall. @param scale pixels of one module */
export function drawCode(
  text: string,
  { width = 640, height = 360, scale = 7.3, noise = 0 } = {},
): { width: number; height: number; data: Uint8ClampedArray } {
  const { data: modules, size } = encode(text, { ecc: 'H', border: 4 });
  const data = new Uint8ClampedArray(width * height * 4);
  const left = (width - size * scale) / 2;
  const top = (height - size * scale) / 2;
  let seed = 7;
  for (let y = 0; y < height; y += 1)
    for (let x = 0; x < width; x += 1) {
      const module = modules[Math.floor((y - top) / scale)]?.[Math.floor((x - left) / scale)];
      // The same noise in every run.
      seed = (seed * 16_807) % 2_147_483_647;
      const off = ((seed / 2_147_483_647) * 2 - 1) * noise;
      const grey = (module === undefined ? 128 : module ? 30 : 225) + off;
      data.set([grey, grey, grey, 255], (y * width + x) * 4);
    }
  return { width, height, data };
}
