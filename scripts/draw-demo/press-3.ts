import {
  balloon,
  box,
  centreLine,
  dimension,
  disc,
  group,
  label,
  line,
  seen,
  shape,
  warning,
  words,
} from './drawing.ts';
import { type Film, type Shot } from './film.ts';
import { drum, drumEnd, shaft } from './machine.ts';

/** A wood lathe round the drum on its shaft: headstock, tailstock, bed and the tool's rest. */
export function lathe(): string {
  return [
    box(-330, 128, 720, 26, 'dark-plate'),
    box(-330, 154, 720, 12, 'plate'),
    box(-330, -96, 120, 224, 'paint-up'),
    box(-212, -42, 26, 84, 'bright'),
    box(-188, -30, 42, 60, 'dark-plate'),
    box(310, -70, 80, 198, 'paint-up'),
    shape('M310 -16h-28l-20 16l20 16h28z', 'bright'),
  ].join('');
}

const blank: Shot = {
  chapter: 'The blank',
  cues: [
    {
      text: 'The drum, 120, is maple: dry, no knots, and nothing on it but turning.',
      say: 'The drum, one twenty, is maple. Dry, no knots, and nothing on it but turning.',
    },
    {
      text: 'It is 196 millimetres long, keyed to the shaft, and goes in a little over 160.',
      say: 'It is one hundred and ninety six millimetres long, keyed to the shaft, and goes in a little over one sixty.',
    },
    { text: 'Juice runs over it, so no glue, no stain and no varnish.' },
  ],
  draw: ({ come, on }) => {
    const scale = 1.75;
    return [
      seen(lathe() + shaft() + drum({ across: 168, blades: false }), 30, 10, scale),
      group(balloon(420, 120, '120', [560, 230], on(0, 2)), { opacity: come(0, 0.3) }),
      group(balloon(930, 200, '117', [880, 345], on(1)), { opacity: come(1, 1.8) }),
      group(dimension(416, 560, 759, 560, '196 mm', { from: -50 }), { opacity: come(1) }),
      group(warning('Food touches it: leave it bare'), { opacity: come(2, 0.4) }),
    ].join('');
  },
};

const turning: Shot = {
  chapter: 'Roughing and truing',
  cues: [
    {
      text: 'Rough the drum at 350 turns a minute, finish it at 700.',
      say: 'Rough the drum at three hundred and fifty turns a minute. Finish it at seven hundred.',
    },
    { text: 'No gloves and no sleeves near it, and stop it before you measure.' },
    {
      text: 'The plan says 160. I have 160.4.',
      say: 'The plan says one sixty. I have one sixty point four.',
    },
    {
      text: 'I leave it there: the comb, 115, adjusts for more than that.',
      say: 'I leave it there. The comb, one fifteen, adjusts for more than that.',
    },
  ],
  draw: ({ at, come, on }) => {
    const scale = 1.75;
    const measured = come(2, -0.2, 0.6);
    const pass = (at * 0.16) % 1;
    const tool = -96 + pass * 190;
    const chips = Array.from({ length: 9 }, (_none, index) => {
      const [dx, dy] = [Math.sin(index * 2.4) * 26, 10 + ((index * 17 + at * 90) % 70)];
      return `<path d="M${String(tool + dx)} ${String(82 + dy * 0.5)}q4 -5 8 0" fill="none" stroke="#e0c392" stroke-width="1.6"/>`;
    }).join('');
    return [
      seen(
        lathe() +
          shaft() +
          drum({ across: 164 - 3.6 * Math.min(1, at / 9), blades: false }) +
          group(
            box(-120, 96, 250, 9, 'plate') + shape(`M${String(tool - 5)} 132l5 -50l5 50z`, 'bright') + chips,
            { opacity: 1 - measured },
          ),
        30,
        10,
        scale,
      ),
      group(
        [
          label(820, 96, '350 rpm to rough', come(0, 1.6) < 0.5 ? 'brass' : 'plain'),
          label(820, 156, '700 rpm to finish', come(0, 1.6) >= 0.5 ? 'brass' : 'plain'),
        ].join(''),
        { opacity: come(0, 0.2) * (1 - measured) },
      ),
      group(warning('Stop it before you touch it'), { opacity: come(1) * (1 - measured) }),
      group(
        dimension(880, 214, 880, 495, '160.4', { from: -110 }) +
          words(930, 150, '160.4 mm as made', { size: 28, kind: 'strong' }) +
          words(930, 188, 'plan 160 mm', { size: 24, kind: 'faint' }),
        { opacity: measured },
      ),
      group(balloon(420, 120, '120', [560, 240], on(0, 2)), { opacity: 1 }),
      group(comb(1000, 588, 1.7) + balloon(1210, 470, '115', [1130, 560], on(3)), { opacity: come(3, 0.2) }),
    ].join('');
  },
};

/** The stator comb from above. */
function comb(x: number, y: number, scale: number): string {
  const teeth = Array.from({ length: 11 }, (_none, index) =>
    box(-96 + index * 18, -2, 10, 34, 'stainless'),
  ).join('');
  return group(
    box(-99, -24, 198, 26, 'stainless') + teeth + disc(-80, -11, 5, '#10161a') + disc(80, -11, 5, '#10161a'),
    {
      move: `translate(${String(x)} ${String(y)}) scale(${String(scale)})`,
    },
  );
}

const blades: Shot = {
  chapter: 'Blades',
  cues: [
    {
      text: 'Eight blades, 121, two millimetre stainless, 194 long, one every 45 degrees.',
      say: 'Eight blades, one twenty one, two millimetre stainless, one ninety four long, one every forty five degrees.',
    },
    { text: 'Number blades and slots with a paint pen before you take them out again.' },
    { text: 'How far they stand out I have not decided: two millimetres, or three.' },
    { text: 'I will mill a bucket with each and tell you.' },
  ],
  draw: ({ at, come, on }) => {
    const side = come(1, -0.2, 0.8);
    const proud = come(2, 1.6);
    const close = come(2, -0.3, 1.2);
    const count = Math.min(8, Math.floor(1 + at * 1.6));
    const [x, y, zoom] = [40 * (1 - close) + 0 * close, -64 * close, 2.9 + 5.2 * close];
    return [
      seen(drumEnd({ blades: side > 0 ? 8 : count, proud: 3 }), x, y, zoom),
      group(
        [
          centreLine(640 - 40 * 2.9, 372, 1010, 372),
          label(900, 150, '8 × 45°', 'plain'),
          label(900, 214, '194 × 2 mm', 'plain'),
        ].join(''),
        { opacity: come(0, 1.2) * (1 - side) },
      ),
      group(balloon(900, 560, '121', [524 + 163, 372 + 172], on(0, 1)), {
        opacity: come(0, 0.2) * (1 - close),
      }),
      group(slotNumbers(524, 372, 190), { opacity: side * (1 - close) }),
      group(
        [
          line('M460 243H820', 'mark', 'stroke-dasharray="12 6"'),
          label(760, 150, 'two or three millimetres?', 'brass'),
        ].join(''),
        { opacity: proud },
      ),
    ].join('');
  },
};

/** The numbers of slots and blades, round the drum's end. */
export function slotNumbers(x: number, y: number, radius: number): string {
  return Array.from({ length: 8 }, (_none, index) => {
    const angle = (index * 45 - 78) * (Math.PI / 180);
    const [nx, ny] = [x + Math.cos(angle) * radius, y + Math.sin(angle) * radius];
    return `${disc(nx, ny, 21, '#fcfdfc')}<text font-family="Karla" font-weight="700" font-size="28" fill="#202c82" text-anchor="middle" x="${String(nx)}" y="${String(ny + 10)}">${String(index + 1)}</text>`;
  }).join('');
}

export const PRESS_3: Film = {
  file: 'press-3.mp4',
  captions: 'press-3.vtt',
  episode: '3',
  shots: [blank, turning, blades],
};
