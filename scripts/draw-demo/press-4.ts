import {
  balloon,
  box,
  centreLine,
  centrePop,
  dimension,
  disc,
  group,
  label,
  line,
  push,
  seen,
  shape,
  triangle,
  warning,
  words,
} from './drawing.ts';
import { type Film, type Shot } from './film.ts';
import { bearing, drum, housing, lyingCylinder, press, shaft, sidePlate, thread } from './machine.ts';

/** The metal lathe round the bar. */
function lathe(tool: number): string {
  return [
    box(-330, 120, 720, 40, 'dark-plate'),
    box(-330, -110, 90, 230, 'paint-up'),
    shape('M-240 -86h46v34h-16v104h16v34h-46z', 'bright'),
    box(-212, -40, 74, 25, 'dark-plate'),
    box(-212, 15, 74, 25, 'dark-plate'),
    box(330, -60, 60, 180, 'paint-up'),
    shape('M330 -16h-46l-20 16l20 16h46z', 'bright'),
    box(tool - 34, 62, 68, 58, 'dark-plate'),
    shape(`M${String(tool - 12)} 62v-30l12 -12l12 12v30z`, 'bright'),
  ].join('');
}

const drumShaft: Shot = {
  chapter: 'Drum shaft',
  cues: [
    { text: 'Morning. Two jobs: the drum shaft, and a cylinder that came with the wrong ports.' },
    {
      text: 'Drum shaft, 117. Face it and centre it: 412 millimetres, from 40 millimetre bright bar.',
      say: 'Drum shaft, one seventeen. Face it and centre it. Four hundred and twelve millimetres, from forty millimetre bright bar.',
    },
    {
      text: 'The bearing seats are 35 k6: two to eighteen microns over.',
      say: 'The bearing seats are thirty five, k six. That is two to eighteen microns over.',
    },
    {
      text: 'I get nine. 35.009, so it is inside.',
      say: 'I get nine. Thirty five, point oh oh nine. So it is inside.',
    },
  ],
  draw: ({ at, come, on }) => {
    const close = come(2, -0.2, 1.3);
    const [x, y, zoom] = [30 - 147 * close, 10 * (1 - close) - 8 * close, 1.75 + 3.6 * close];
    const turned = come(1, 2.4, 2);
    const tool = 220 - Math.min(1, Math.max(0, (at - 5) / 7)) * 330;
    const seat = (px: number, py: number): [number, number] => [640 + (px - x) * zoom, 372 + (py - y) * zoom];
    return [
      seen(
        lathe(tool + close * 260) +
          group(shaft({ rough: true }), { opacity: 1 - turned }) +
          group(shaft() + group(box(-129, -17.5, 24, 35, 'dyed'), { opacity: close * (1 - come(3, 0.2)) }), {
            opacity: turned,
          }),
        x,
        y,
        zoom,
      ),
      group(balloon(460, 150, '117', [600, 348], on(0, 1)), { opacity: come(0, 0.4) * (1 - close) }),
      group(centrePop(381 + 721, 355, 13), { opacity: come(1, 0.9) * (1 - come(1, 3)) }),
      group(dimension(328, 540, 1049, 540, '412 mm', { from: -150 }), {
        opacity: come(1, 1.6) * (1 - close),
      }),
      group(
        [
          dimension(seat(-129, 0)[0], 160, seat(-105, 0)[0], 160, '', { from: 110 }),
          line(`M${String(seat(-117, 0)[0])} 160V118`, 'soft'),
          label(seat(-117, 0)[0] - 96, 66, 'seat, 35 k6', 'dye'),
          balloon(1000, 170, '119', seat(-110, -17), on(2, 3)),
        ].join(''),
        { opacity: close },
      ),
      group(ladder(come(3, 0.5)), { opacity: come(2, 1.2) }),
    ].join('');
  },
};

/** Where a measured seat lies between its limits, in thousandths of a millimetre over 35. */
function ladder(read: number): string {
  const at = (microns: number) => 190 + microns * 45;
  const marks = Array.from({ length: 21 }, (_none, index) =>
    line(`M${String(at(index))} 640v${index % 5 === 0 ? '-26' : '-15'}`, 'ink'),
  ).join('');
  return [
    `<rect x="150" y="548" width="980" height="112" class="paper" stroke="#9aa9ae" stroke-width="1.6"/>`,
    `<rect x="${String(at(2))}" y="596" width="${String(at(18) - at(2))}" height="44" fill="#17695b"/>`,
    marks,
    words(at(2), 588, '35.002', { size: 22, kind: 'mono', anchor: 'middle' }),
    words(at(18), 588, '35.018', { size: 22, kind: 'mono', anchor: 'middle' }),
    group(
      `<path d="M${String(at(9))} 660l-13 -20v-46h26v46z" fill="#d9a441"/>${words(at(9), 586, '35.009', { size: 26, kind: 'mono', anchor: 'middle' })}`,
      { opacity: read },
    ),
  ].join('');
}

const housings: Shot = {
  chapter: 'Bearing housings',
  cues: [
    {
      text: 'Bearing housings, 118, with a sealed 6207 in each. That is 119.',
      say: 'Bearing housings, one eighteen, with a sealed sixty two oh seven in each. That is one nineteen.',
    },
    { text: 'Press a bearing on by its inner ring. Through the balls, you mark the races.' },
    { text: 'The feet are slotted, so the drum can be squared up before the bolts are nipped.' },
    { text: 'Guard the drum before it turns under power, and lock the motor out to clear a jam.' },
  ],
  draw: ({ come, on }) => {
    const slide = 1 - come(0, 0.6, 2.2);
    const close = come(1, -0.2, 1.2) * (1 - come(2, -0.2, 1.2));
    const [x, y, zoom] = [40 - 150 * close, 0 - 20 * close, 2.05 + 3.4 * close];
    const at = (px: number, py: number): [number, number] => [640 + (px - x) * zoom, 372 + (py - y) * zoom];
    const feet = [-1, 1]
      .map((side) =>
        group(
          box(side < 0 ? -171 : 109, 62, 62, 12, 'plate') +
            box(side < 0 ? -160 : 128, 64.5, 32, 7, '#10161a', 3.5) +
            box(side < 0 ? -149 : 139, 55, 10, 26, 'bright'),
          {},
        ),
      )
      .join('');
    return [
      seen(
        [
          box(-190, 74, 400, 22, 'dark-plate'),
          sidePlate(-104),
          sidePlate(104),
          shaft(),
          drum(),
          group(bearing(-119) + housing(-119), { move: `translate(${String(-110 * slide)} 0)` }),
          group(bearing(119) + housing(119), { move: `translate(${String(150 * slide)} 0)` }),
          group(feet, { opacity: 1 - slide }),
          centreLine(-190, 0, 290, 0),
        ].join(''),
        x,
        y,
        zoom,
      ),
      group(balloon(200, 190, '118', at(-122, -62), on(0, 2)), { opacity: come(0, 1.2) * (1 - close) }),
      group(balloon(130, 330, '119', at(-121, -27), on(0)), { opacity: come(0, 3) * (1 - close) }),
      group(balloon(560, 110, '120', at(-20, -76), on(3)), { opacity: (1 - close) * come(0) }),
      group(balloon(1110, 200, '117', at(220, -10), 0), { opacity: (1 - close) * come(0) }),
      group(
        push(...at(-172, -20.5), ...at(-130, -20.5)) +
          label(60, 560, 'Push here, on the inner ring', 'brass'),
        {
          opacity: close * come(1, 0.8),
        },
      ),
      group(balloon(470, 640, '118', at(-122, 50), on(1)), { opacity: close }),
      group(push(480, 556, 360, 556) + push(800, 556, 920, 556) + label(545, 592, 'slotted feet', 'plain'), {
        opacity: come(2, 0.9) * (1 - come(3, -0.1)),
      }),
      group(warning('Guard on, motor locked out'), { opacity: come(3) }),
    ].join('');
  },
};

const ports: Shot = {
  chapter: 'Cylinder and ports',
  cues: [
    {
      text: 'Now the cylinder, 124. The plans show 3/8 NPT ports. These are G 3/8.',
      say: 'Now the cylinder, one twenty four. The plans show three eighths N P T ports. These are G three eighths.',
    },
    { text: 'Nineteen threads to the inch and parallel, against eighteen and tapered.' },
    { text: 'They nearly screw together, and they must not. Under pressure that lets go.' },
    {
      text: 'So an adapter goes on both lines, 125. That is a change from the plans.',
      say: 'So an adapter goes on both lines, one twenty five. That is a change from the plans.',
    },
    { text: 'Let the pressure down before you open a line. A jet of oil goes through skin.' },
    {
      text: 'The relief valve, 127, is set at 110 bar, and the gauge, 129, reads to 250.',
      say: 'The relief valve, one twenty seven, is set at one hundred and ten bar. And the gauge, one twenty nine, reads to two fifty.',
    },
  ],
  draw: ({ come, on }) => {
    const threads = come(1, -0.3, 0.8) * (1 - come(3, -0.3, 0.8));
    const gauge = come(5, -0.3, 0.8);
    const whole = (1 - threads) * (1 - gauge);
    const fit = come(3, 0.8, 1.4);
    const adapters = [-299, 276]
      .map((px) =>
        group(
          box(px - 20, -132, 40, 18, 'brass') +
            box(px - 27, -172, 54, 40, 'brass') +
            box(px - 15, -230, 30, 58, 'bright-up'),
          {
            move: `translate(0 ${String(36 - 90 * (1 - fit))})`,
          },
        ),
      )
      .join('');
    return [
      group(
        seen(group(adapters, { opacity: come(3, 0.2) }) + lyingCylinder(), 40, -50, 1.15) +
          balloon(640, 610, '124', [640, 495], on(0, 2)) +
          group(label(150, 170, 'G 3/8', 'brass') + line('M230 222L262 330', 'mark'), {
            opacity: come(0, 3.2) * (1 - come(3, -0.3)),
          }) +
          group(
            balloon(110, 230, '125', [236, 290], on(3), { inPlans: false }) +
              triangle(450, 240, 'C') +
              words(526, 214, 'Not in revision B:', { size: 25, kind: 'strong' }) +
              words(526, 246, 'it comes with the next', { size: 24 }),
            {
              opacity: come(3, 1),
            },
          ) +
          group(warning('Let the pressure down first'), { opacity: come(4) }),
        { opacity: whole },
      ),
      group(twoThreads(come(2, 0.2)), { opacity: threads }),
      group(relief(on(5), come(5, 0.8, 2)), { opacity: gauge }),
    ].join('');
  },
};

/** The port's thread beside that of the plans, nine pixels a millimetre. G 3/8 by ISO 228-1, 3/8 NPT by ASME B1.20.1. */
export function twoThreads(never: number): string {
  return [
    group(thread({ pitch: 12.03, depth: 7.7, length: 361, across: 150 }), {
      move: 'translate(100 400) scale(1.42)',
    }),
    group(thread({ pitch: 12.7, depth: 10.2, length: 356, across: 154, taper: 11 }), {
      move: 'translate(690 400) scale(1.42)',
    }),
    centreLine(70, 400, 1225, 400),
    words(100, 200, 'G 3/8, as it came', { size: 31, kind: 'strong' }),
    words(100, 238, '16.66 mm, 19 to the inch, parallel', { size: 22, kind: 'faint' }),
    words(690, 200, '3/8 NPT, as planned', { size: 31, kind: 'strong' }),
    words(690, 238, '17.1 mm, 18 to the inch, tapered 1 in 16', { size: 22, kind: 'faint' }),
    group(
      `<path d="M600 300l96 200M696 300l-96 200" stroke="#d0553a" stroke-width="12"/>${warning('Never one into the other')}`,
      { opacity: never },
    ),
  ].join('');
}

/** Pump line with its relief valve and gauge, as a dial and a block. */
function relief(on: number, rise: number): string {
  const angle = 135 + rise * (110 / 250) * 270;
  const [x, y, r] = [760, 350, 170];
  const mark = (bar: number, length: number) => {
    const a = ((135 + (bar / 250) * 270) * Math.PI) / 180;
    const [c, s] = [Math.cos(a), Math.sin(a)];
    return `M${String(x + c * (r - 14))} ${String(y + s * (r - 14))}L${String(x + c * (r - 14 - length))} ${String(y + s * (r - 14 - length))}`;
  };
  const marks = Array.from({ length: 26 }, (_none, index) =>
    mark(index * 10, index % 5 === 0 ? 24 : 12),
  ).join('');
  const numbers = [0, 50, 100, 150, 200, 250].map((bar) => {
    const a = ((135 + (bar / 250) * 270) * Math.PI) / 180;
    return `<text font-family="Spline Sans Mono" font-weight="500" font-size="21" fill="#1a2024" text-anchor="middle" x="${String(x + Math.cos(a) * (r - 60))}" y="${String(y + 7 + Math.sin(a) * (r - 60))}">${String(bar)}</text>`;
  });
  const needle = (angle * Math.PI) / 180;
  return [
    box(150, 556, 980, 30, 'bright'),
    box(x - 16, 500, 32, 60, 'brass'),
    disc(x, y, r + 14, 'dark-plate'),
    disc(x, y, r, '#fcfdfc'),
    `<path d="${marks}" stroke="#1a2024" stroke-width="2.4"/>`,
    ...numbers,
    `<text font-family="Karla" font-weight="700" font-size="22" fill="#4b565c" text-anchor="middle" x="${String(x)}" y="${String(y + 96)}">bar</text>`,
    `<path d="M${String(x)} ${String(y)}L${String(x + Math.cos(needle) * (r - 26))} ${String(y + Math.sin(needle) * (r - 26))}" stroke="#a2391f" stroke-width="7" stroke-linecap="round"/>`,
    disc(x, y, 13, '#1a2024'),
    box(300, 500, 120, 142, 'dark-plate'),
    box(324, 420, 72, 82, 'brass'),
    box(346, 360, 28, 62, 'bright-up'),
    balloon(200, 380, '127', [336, 440], on),
    balloon(1060, 250, '129', [x + 165, y - 60], on),
    label(90, 250, 'set at 110 bar', 'brass'),
  ].join('');
}

const platen: Shot = {
  chapter: 'Platen and drip tray',
  cues: [
    {
      text: 'Under load the platen, 106, comes down sixty millimetres.',
      say: 'Under load, the platen, one oh six, comes down sixty millimetres.',
    },
    {
      text: 'The drip tray, 131, slopes ten millimetres to the spout, 132.',
      say: 'The drip tray, one thirty one, slopes ten millimetres to the spout, one thirty two.',
    },
    { text: 'I have not decided whether the spout gets a valve.' },
    {
      text: 'If you have one of 38 millimetres: does it clog? Tell me below.',
      say: 'If you have one of thirty eight millimetres, does it clog? Tell me below.',
    },
  ],
  draw: ({ come, on }) => {
    const down = come(0, 0.8, 2.4);
    const away = come(1, -0.3, 0.7);
    const [x, y, zoom] = [0, -520, 0.66];
    const at = (px: number, py: number): [number, number] => [640 + (px - x) * zoom, 372 + (py - y) * zoom];
    const top = -170 - 366 - 20;
    const [, from] = at(0, top);
    const [, to] = at(0, top + 160);
    return [
      group(
        seen(press({ ram: 89 + 160 * down, stack: 366 - 160 * down }), x, y, zoom) +
          group(balloon(300, 300, '106', at(-206, top + 10 + 160 * down), on(0)), { opacity: come(0, 0.4) }) +
          group(dimension(960, from, 960, to, '160 mm', { from: -170 }), { opacity: come(0, 2.2) }),
        { opacity: 1 - away },
      ),
      group(
        [
          trayInSection(),
          balloon(330, 200, '131', [420, 398], on(1)),
          balloon(1150, 250, '132', [1112, 424], on(1, 2, 3)),
          group(label(760, 590, 'a valve, or none?', 'brass'), { opacity: come(2) * (1 - come(3)) }),
          group(label(760, 590, 'does 38.1 mm clog?', 'brass'), { opacity: come(3) }),
        ].join(''),
        { opacity: away },
      ),
    ].join('');
  },
};

/** The tray on its bed plate, cut along its slope, 1.7 px a millimetre: 560 long and 10 down to the spout. */
function trayInSection(): string {
  return [
    box(110, 470, 1060, 130, 'plate'),
    line('M110 482h1060M110 588h1060', 'soft'),
    box(140, 436, 952, 34, 'hatch'),
    shape('M140 436l952 0l0 -6l-952 -17z', '#8a6a3d'),
    shape('M140 340h10v65l932 17v-82h10v92l-952 -19z', 'stainless'),
    shape('M150 402l932 17v-9l-932 -8z', '#c98a2b'),
    shape('M1092 398h96v104h-58v-44h-38z', 'stainless'),
    shape('M1092 408h76v94h-24v-54h-52z', '#1a2226'),
    `<path d="M1158 502q8 34 0 62q-8 -28 0 -62z" fill="#c98a2b"/>`,
    line('M150 404H1240', 'mark', 'stroke-dasharray="14 7"'),
    line('M960 330v74M960 460v-37M948 404h24M948 421h24', 'ink'),
    `<path class="tip" d="M960 404l-5 -16h10zM960 423l-5 16h10z"/>`,
    words(960, 318, '10 mm', { size: 26, kind: 'mono', anchor: 'middle' }),
  ].join('');
}

export const PRESS_4: Film = {
  file: 'press-4.mp4',
  captions: 'press-4.vtt',
  episode: '4',
  shots: [drumShaft, housings, ports, platen],
};
