import {
  balloon,
  box,
  centreLine,
  dimension,
  group,
  label,
  line,
  push,
  seen,
  shape,
  warning,
  words,
} from './drawing.ts';
import { type Film, type Shot } from './film.ts';
import { press } from './machine.ts';

const whatItHolds: Shot = {
  chapter: 'What it has to hold',
  cues: [
    { text: 'This is the press. Base rails, uprights, and a head beam.' },
    {
      text: 'The cylinder, 124, pushes down between them.',
      say: 'The cylinder, one twenty four, pushes down between them.',
    },
    {
      text: 'At 110 bar it pushes 86 kilonewtons, near enough nine tonnes.',
      say: 'At one hundred and ten bar, it pushes eighty six kilo newtons. Near enough nine tonnes.',
    },
    { text: 'All of that pulls on this frame, so have your own checked before you load it.' },
  ],
  draw: ({ come, on }) => {
    const near = come(2, 0, 1.6);
    const [x, y, zoom] = [0, -790 - near * 20, 0.385 + near * 0.01];
    const at = (px: number, py: number): [number, number] => [640 + (px - x) * zoom, 372 + (py - y) * zoom];
    const load = come(2, 0.4, 0.8);
    return [
      seen(press({ ram: 89 + 40 * load, stack: 366 - 40 * load }), x, y, zoom),
      group(balloon(300, 610, '101', at(-430, -60), on(0)), { opacity: come(0, 0.6) }),
      group(balloon(300, 380, '102', at(-345, -800), on(0)), { opacity: come(0, 1) }),
      group(balloon(300, 170, '103', at(-370, -1500), on(0)), { opacity: come(0, 1.5) }),
      group(balloon(960, 300, '124', at(40, -1150), on(1, 2)), { opacity: come(1) }),
      group(balloon(960, 470, '106', at(200, -540 + 40 * load), on(1)), { opacity: come(1, 0.9) }),
      group(
        [
          push(...at(-330, -880), ...at(-330, -1180)),
          push(...at(330, -880), ...at(330, -1180)),
          push(...at(0, -740), ...at(0, -560)),
          words(1020, 572, '86 kN', { size: 46, kind: 'mono' }),
          words(1020, 612, 'at 110 bar on a 100 mm bore', { size: 19, kind: 'faint' }),
        ].join(''),
        { opacity: load },
      ),
      group(warning('Have a licensed person check the frame'), { opacity: come(3) }),
    ].join('');
  },
};

const cutting: Shot = {
  chapter: 'Cutting the rails',
  cues: [
    {
      text: 'Base rails, 101, from 100 by 50 by 4 box.',
      say: 'Base rails, one oh one, from one hundred, by fifty, by four box.',
    },
    {
      text: 'Nine hundred millimetres, both cut in one clamping, so they come out the same.',
    },
    {
      text: 'Uprights, 102, are 1450, from 80 by 80 by 5.',
      say: 'Uprights, one oh two, are fourteen fifty, from eighty, by eighty, by five.',
    },
  ],
  draw: ({ at, come, on }) => {
    const away = come(2, -0.2, 0.9);
    const cut = Math.min(1, Math.max(0, (at - 4.4) / 3));
    const rails = [
      box(150, 560, 980, 14, 'dark-plate'),
      box(330, 520, 70, 40, 'dark-plate'),
      box(860, 520, 70, 40, 'dark-plate'),
      box(190, 420, 900, 100, 'plate'),
      line('M190 430h900M190 510h900', 'soft'),
      box(190, 316, 900, 100, 'plate'),
      line('M190 326h900M190 406h900', 'soft'),
      box(372, 290, 56, 26, 'dark-plate'),
      box(832, 290, 56, 26, 'dark-plate'),
      box(1086, 130 + cut * 220, 9, 210, 'stainless'),
      box(1000, 110 + cut * 220, 180, 42, 'dark-plate'),
      group(dimension(190, 260, 1090, 260, '900 mm', { from: 46 }), { opacity: come(1) }),
      group(balloon(110, 440, '101', [200, 468], on(0, 1)), { opacity: come(0, 0.3) }),
      group(section(1010, 610, 50, 100, 4, '100 × 50 × 4'), { opacity: come(0, 1.4) * (1 - come(1, 3)) }),
    ].join('');
    const uprights = [
      box(130, 330, 1020, 56, 'plate'),
      line('M130 338h1020M130 378h1020', 'soft'),
      box(130, 400, 1020, 56, 'plate'),
      line('M130 408h1020M130 448h1020', 'soft'),
      dimension(130, 280, 1150, 280, '1450 mm', { from: 44 }),
      balloon(72, 560, '102', [150, 440], on(2)),
      section(640, 570, 80, 80, 5, '80 × 80 × 5'),
    ].join('');
    return group(rails, { opacity: 1 - away }) + group(uprights, { opacity: away });
  },
};

/** A hollow section seen from its end, at 1.2 px a millimetre. */
function section(x: number, y: number, width: number, height: number, wall: number, name: string): string {
  const [w, h, t] = [width * 1.2, height * 1.2, wall * 1.2];
  return `${box(x - w / 2, y - h / 2, w, h, 'hatch', 6)}${box(x - w / 2 + t, y - h / 2 + t, w - 2 * t, h - 2 * t, '#10161a', 3)}${words(x + w / 2 + 22, y + 9, name, { size: 25, kind: 'mono' })}`;
}

const squaring: Shot = {
  chapter: 'Tacking it square',
  cues: [
    { text: 'The uprights stand on the rails, over both of them, not beside them.' },
    { text: 'Tack it, then measure both diagonals.' },
    {
      text: 'I get 1627 and 1629. On paper both are 1628.',
      say: 'I get sixteen twenty seven, and sixteen twenty nine. On paper, both are sixteen twenty eight.',
    },
    { text: 'One clamp across the long one, and it stays on while I weld.' },
    {
      text: 'Gussets to the base rails, 104: E7018, 3.2 millimetre rods, 115 amps.',
      say: 'Gussets to the base rails, one oh four. E seventy eighteen. Three point two millimetre rods. One hundred and fifteen amps.',
    },
    { text: 'Doors open, fan behind you, head out of the smoke, and a screen round the arc.' },
  ],
  draw: ({ come, on }) => {
    const closer = come(4, -0.3, 1.4);
    const [x, y, zoom] = [0 - 250 * closer, -790 + 580 * closer, 0.385 + 1.0 * closer];
    const at = (px: number, py: number): [number, number] => [640 + (px - x) * zoom, 372 + (py - y) * zoom];
    const pulled = come(3, 0.6, 1.2);
    const skew = 0.09 * (1 - pulled);
    const diagonals = come(1, 0.2) * (1 - closer);
    const [ax, ay] = at(-370, -110);
    const [bx, by] = at(370, -1560);
    const [cx, cy] = at(370, -110);
    const [dx, dy] = at(-370, -1560);
    return [
      seen(press({ withRam: false, withStack: false, skew, withGussets: closer > 0 }), x, y, zoom),
      group(
        line(
          `M${String(ax)} ${String(ay)}L${String(bx)} ${String(by)}M${String(cx)} ${String(cy)}L${String(dx)} ${String(dy)}`,
          'mark',
          'stroke-dasharray="10 6"',
        ),
        { opacity: diagonals },
      ),
      group(
        [
          label(880, 220, pulled > 0.5 ? '1628' : '1629', 'brass'),
          label(310, 220, pulled > 0.5 ? '1628' : '1627', 'brass'),
        ].join(''),
        { opacity: come(2) * (1 - closer) },
      ),
      group(
        [
          shape(`M${String(dx - 16)} ${String(dy - 14)}h14v14h-14z`, 'brass'),
          push(cx + 120, cy - 60, cx + 12, cy - 8),
          push(dx - 110, dy + 46, dx - 10, dy + 6),
        ].join(''),
        { opacity: come(3, 0.2) * (1 - closer) },
      ),
      group(fromTheSide(1010, 470), { opacity: come(0, 0.6) * (1 - come(2, -0.2)) }),
      group(balloon(330, 470, '102', at(-345, -700), on(0)), { opacity: come(0, 0.3) * (1 - closer) }),
      group(balloon(330, 620, '101', at(-430, -60), on(0)), { opacity: come(0, 0.6) * (1 - closer) }),
      group(balloon(900, 250, '104', at(-250, -150), on(4)), { opacity: come(4, 0.5) }),
      group(beads(at), { opacity: come(4, 1.4, 1) }),
      group(label(942, 224, 'E7018, 3.2 mm, 115 A', 'plain'), { opacity: come(4, 2) }),
      group(warning('Head out of the smoke, screen round the arc'), { opacity: come(5) }),
    ].join('');
  },
};

/** Where the gusset is welded: a row of ripples along its two edges. */
function beads(at: (x: number, y: number) => [number, number]): string {
  const ripples = Array.from({ length: 15 }, (_none, index) => [
    at(-282 + index * 7.5, -112),
    at(-288, -118 - index * 7.5),
  ]).flat();
  return ripples
    .map(
      ([x, y]) =>
        `<ellipse cx="${String(x)}" cy="${String(y)}" rx="7" ry="7" fill="#3a464c" stroke="#aebcc1" stroke-width="1.4"/>`,
    )
    .join('');
}

/** Upright over both rails, looking along them. */
function fromTheSide(x: number, y: number): string {
  return [
    box(x - 48, y - 180, 96, 180, 'post'),
    box(x - 84, y, 60, 120, 'hatch', 5),
    box(x - 79, y + 5, 50, 110, '#10161a', 3),
    box(x + 24, y, 60, 120, 'hatch', 5),
    box(x + 29, y + 5, 50, 110, '#10161a', 3),
    centreLine(x, y - 200, x, y + 140),
    dimension(x - 24, y + 62, x + 24, y + 62, '40', { size: 18 }),
  ].join('');
}

export const PRESS_1: Film = {
  file: 'press-1.mp4',
  captions: 'press-1.vtt',
  episode: '1',
  shots: [whatItHolds, cutting, squaring],
};
