import { box, centreLine, disc, group, line, shape } from './drawing.ts';

/** The press and its mill, to scale: millimetres, y downwards from the floor at 0. */

/** The front of the press. @param out how far the ram is out, in mm; @param stack height of the cheeses, in mm */
export function press({
  ram = 0,
  withRam = true,
  stack = 366,
  withStack = true,
  skew = 0,
  withGussets = true,
}: {
  ram?: number;
  withRam?: boolean;
  stack?: number;
  withStack?: boolean;
  /** How far the top leans over, in mm. */
  skew?: number;
  withGussets?: boolean;
} = {}): string {
  const frame = [
    box(-370, -1560, 80, 1450, 'post'),
    box(290, -1560, 80, 1450, 'post'),
    line('M-362 -1560v1450M-298 -1560v1450M298 -1560v1450M362 -1560v1450', 'soft', 'stroke-opacity="0.45"'),
    box(-390, -1560, 780, 120, 'plate'),
    line('M-390 -1550H390M-390 -1450H390', 'soft'),
    ...(withGussets
      ? [
          shape('M-290 -110v-120l120 120z', 'dark-plate'),
          shape('M290 -110v-120l-120 120z', 'dark-plate'),
          shape('M-290 -1440v120l120 -120z', 'dark-plate'),
          shape('M290 -1440v120l-120 -120z', 'dark-plate'),
        ]
      : []),
  ].join('');
  const base = [
    box(-450, -110, 900, 100, 'plate'),
    line('M-450 -100H450M-450 -20H450', 'soft'),
    box(-430, -10, 120, 10, 'dark-plate'),
    box(310, -10, 120, 10, 'dark-plate'),
  ].join('');
  const platenTop = -645 + ram;
  const cylinder = [
    box(-80, -1440, 160, 22, 'dark-plate'),
    box(-22.5, -735, 45, 90 + ram, 'bright-up'),
    box(-58, -1418, 116, 683, 'paint-up'),
    box(-66, -760, 132, 32, 'dark-plate'),
    box(58, -1380, 26, 30, 'bright'),
    box(58, -800, 26, 30, 'bright'),
    box(-288, platenTop - 10, 576, 10, 'bright'),
    box(-210, platenTop, 420, 20, 'plate'),
  ].join('');
  return group(
    [
      base,
      group(frame, skew === 0 ? {} : { move: `translate(0 -110) skewX(${String(-skew)}) translate(0 110)` }),
      withStack || withRam ? tray() : '',
      withStack ? cheeses(stack) : '',
      withRam ? cylinder : '',
    ].join(''),
  );
}

/** The bed plate with its tray and the spout, from the front. */
export function tray(): string {
  return [
    box(-280, -130, 560, 20, 'plate'),
    shape('M-280 -170v40h560v-40h-10v30h-540v-30z', 'stainless'),
    shape('M262 -146h58v38h-22v-16h-36z', 'stainless'),
  ].join('');
}

function cheeses(height: number): string {
  const each = height / 6;
  return Array.from({ length: 6 }, (_none, index) => {
    const y = -170 - each * (index + 1);
    return (
      box(-212, y, 424, each - 16, '#c9b48a', 8) +
      line(`M-205 ${String(y + (each - 16) / 2)}H205`, 'soft', 'stroke-opacity="0.5"') +
      box(-235, y + each - 16, 470, 16, 'board')
    );
  }).join('');
}

/** The drum shaft lying along x, its drum centred on 0; 412 mm from -148 to 264. */
export function shaft({ rough = false }: { rough?: boolean } = {}): string {
  if (rough) return box(-148, -20, 412, 40, 'bright');
  return [
    box(-148, -15, 39, 30, 'bright'),
    box(-129, -17.5, 24, 35, 'bright'),
    box(-105, -20, 210, 40, 'bright'),
    box(105, -17.5, 24, 35, 'bright'),
    box(129, -15, 135, 30, 'bright'),
  ].join('');
}

/** A ball bearing 6207 in section on the shaft, its middle at x. */
export function bearing(x: number): string {
  return [-1, 1]
    .map((side) => {
      const far = side < 0 ? -36 : 17.5;
      return (
        box(x - 8.5, far, 17, 18.5, 'bright') +
        disc(x, side * 26.7, 5.6, 'bright') +
        line(
          `M${String(x - 8.5)} ${String(side * 22.5)}h17M${String(x - 8.5)} ${String(side * 31)}h17`,
          'soft',
        )
      );
    })
    .join('');
}

/** A bearing housing from the side, in section: 140 high and 20 thick, its bore for the 72 mm bearing. */
export function housing(x: number): string {
  return [
    box(x - 10, -78, 20, 42, 'hatch'),
    box(x - 10, 36, 20, 26, 'hatch'),
    box(x - 10, 62, 52 * Math.sign(x), 0, 'plate'),
  ].join('');
}

export function sidePlate(x: number): string {
  return box(x - 5, -130, 10, 110, 'hatch-back') + box(x - 5, 20, 10, 70, 'hatch-back');
}

/** The maple drum with its blades, lying. @param across in mm */
export function drum({ across = 160, blades = true }: { across?: number; blades?: boolean } = {}): string {
  const half = across / 2;
  const rows = [-0.86, -0.5, 0, 0.5, 0.86];
  return [
    box(-98, -half, 196, across, 'wood'),
    ...Array.from({ length: 9 }, (_none, index) =>
      line(
        `M-96 ${String(-half + 9 + index * (across / 9.2))}q60 ${String(index % 2 === 0 ? 5 : -4)} 192 0`,
        'soft',
        'stroke-opacity="0.35" stroke="#5e4524"',
      ),
    ),
    ...(blades ? rows.map((at) => box(-97, at * half - 2, 194, 4, 'stainless')) : []),
    blades ? box(-97, -half - 3, 194, 4, 'stainless') + box(-97, half - 1, 194, 4, 'stainless') : '',
  ].join('');
}

/** The drum from its end with its eight blades. @param turned in degrees; @param proud in mm */
export function drumEnd({
  turned = 0,
  proud = 3,
  blades = 8,
}: { turned?: number; proud?: number; blades?: number } = {}): string {
  const rings = [70, 58, 45, 33]
    .map(
      (radius) =>
        `<circle r="${String(radius)}" fill="none" stroke="#7a5a30" stroke-opacity="0.5" stroke-width="1"/>`,
    )
    .join('');
  const all = Array.from({ length: 8 }, (_none, index) =>
    group(
      box(-1.6, -80, 3.2, 18, '#3a2a12') + (index < blades ? box(-1, -80 - proud, 2, 20, 'stainless') : ''),
      { move: `rotate(${String(index * 45)})` },
    ),
  ).join('');
  return group(
    disc(0, 0, 80, 'board') +
      rings +
      all +
      disc(0, 0, 20, 'bright') +
      centreLine(-104, 0, 104, 0) +
      centreLine(0, -104, 0, 104),
    {
      move: `rotate(${String(turned)})`,
    },
  );
}

/** The cylinder lying along x, cap at the left; drawn without its hoses. */
export function lyingCylinder(): string {
  return [
    box(330, -22.5, 150, 45, 'bright'),
    box(-345, -58, 675, 116, 'paint'),
    box(-372, -66, 34, 132, 'dark-plate'),
    box(312, -66, 34, 132, 'dark-plate'),
    box(-325, -96, 52, 34, 'bright-up'),
    box(250, -96, 52, 34, 'bright-up'),
    disc(-396, 0, 30, 'dark-plate'),
    disc(-396, 0, 14, '#0f1518'),
  ].join('');
}

/** A thread in outline, as a gauge shows it. @param taper half of it, in px over the length */
export function thread({
  pitch,
  depth,
  length,
  across,
  taper = 0,
}: {
  pitch: number;
  depth: number;
  length: number;
  across: number;
  taper?: number;
}): string {
  const turns = Math.floor(length / pitch);
  const edge = (side: number) =>
    Array.from({ length: turns }, (_none, index) => {
      const x = index * pitch;
      const half = (at: number) => side * (across / 2 - (taper * (length - at)) / length);
      return `${index === 0 ? 'L' : 'L'}${String(x)} ${String(half(x) - side * depth)}L${String(x + pitch / 2)} ${String(half(x + pitch / 2))}`;
    });
  const top = edge(-1).join('');
  const bottom = edge(1)
    .reverse()
    .map((piece) =>
      piece
        .slice(1)
        .split('L')
        .reverse()
        .map((point) => `L${point}`)
        .join(''),
    )
    .join('');
  return (
    shape(
      `M0 0${top}L${String(length)} ${String(-across / 2 + depth)}V${String(across / 2 - depth)}${bottom}Z`,
      'bright',
    ) +
    Array.from({ length: turns }, (_none, index) =>
      line(
        `M${String(index * pitch + pitch / 2)} ${String(-across / 2 + taper * (1 - (index * pitch) / length))}l${String(-pitch / 2)} ${String(across - 2 * taper * (1 - (index * pitch) / length) - depth)}`,
        'soft',
        'stroke-opacity="0.7" stroke="#39454a"',
      ),
    ).join('')
  );
}
