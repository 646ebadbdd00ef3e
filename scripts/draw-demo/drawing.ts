/** Pieces of drawings as SVG text. Sizes are pixels of whatever group they stand in. */

/** The grounds that a drawing can stand on. */
export type Ground = 'bench' | 'sheet';

const INKS = {
  bench: {
    ground: '#1c2529',
    far: '#0f1518',
    ink: '#e6ecea',
    soft: '#9aa9ae',
    paper: '#141b1f',
    grid: '#ffffff',
  },
  sheet: {
    ground: '#f4f7f6',
    far: '#dfe6e4',
    ink: '#1a2024',
    soft: '#5d686d',
    paper: '#fcfdfc',
    grid: '#202c82',
  },
} as const;

const DEFINITIONS = `
<linearGradient id="plate" x1="0" y1="0" x2="1" y2="1"><stop offset="0" stop-color="#7d8d93"/><stop offset="0.5" stop-color="#5f6e74"/><stop offset="1" stop-color="#48555b"/></linearGradient>
<linearGradient id="post" x1="0" y1="0" x2="1" y2="0"><stop offset="0" stop-color="#56656b"/><stop offset="0.5" stop-color="#77878d"/><stop offset="1" stop-color="#4a575d"/></linearGradient>
<linearGradient id="dark-plate" x1="0" y1="0" x2="1" y2="1"><stop offset="0" stop-color="#59676d"/><stop offset="1" stop-color="#354046"/></linearGradient>
<linearGradient id="bright" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="#39454a"/><stop offset="0.25" stop-color="#9db0b6"/><stop offset="0.4" stop-color="#eef4f5"/><stop offset="0.6" stop-color="#93a5ab"/><stop offset="1" stop-color="#2a3439"/></linearGradient>
<linearGradient id="bright-up" x1="0" y1="0" x2="1" y2="0"><stop offset="0" stop-color="#39454a"/><stop offset="0.25" stop-color="#9db0b6"/><stop offset="0.4" stop-color="#eef4f5"/><stop offset="0.6" stop-color="#93a5ab"/><stop offset="1" stop-color="#2a3439"/></linearGradient>
<linearGradient id="dyed" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="#10174a"/><stop offset="0.35" stop-color="#4a5ad0"/><stop offset="0.6" stop-color="#27348f"/><stop offset="1" stop-color="#0b1038"/></linearGradient>
<linearGradient id="paint-up" x1="0" y1="0" x2="1" y2="0"><stop offset="0" stop-color="#151d52"/><stop offset="0.3" stop-color="#4251b8"/><stop offset="0.55" stop-color="#2b3790"/><stop offset="1" stop-color="#0e1440"/></linearGradient>
<linearGradient id="paint" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="#151d52"/><stop offset="0.3" stop-color="#4251b8"/><stop offset="0.55" stop-color="#2b3790"/><stop offset="1" stop-color="#0e1440"/></linearGradient>
<linearGradient id="wood" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="#8a6a3d"/><stop offset="0.3" stop-color="#d9b985"/><stop offset="0.6" stop-color="#b99257"/><stop offset="1" stop-color="#5e4524"/></linearGradient>
<linearGradient id="board" x1="0" y1="0" x2="1" y2="1"><stop offset="0" stop-color="#d9bd8e"/><stop offset="1" stop-color="#b08c57"/></linearGradient>
<linearGradient id="stainless" x1="0" y1="0" x2="1" y2="0"><stop offset="0" stop-color="#8d9ba0"/><stop offset="0.5" stop-color="#d5dee0"/><stop offset="1" stop-color="#8a989d"/></linearGradient>
<linearGradient id="brass" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="#7b5a18"/><stop offset="0.35" stop-color="#efcf86"/><stop offset="1" stop-color="#6d4f12"/></linearGradient>
<pattern id="hatch" width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><rect width="9" height="9" fill="#5f6e74"/><line x1="0" y1="0" x2="0" y2="9" stroke="#c7d3d6" stroke-width="1.6"/></pattern>
<pattern id="hatch-back" width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(-45)"><rect width="9" height="9" fill="#4c5a60"/><line x1="0" y1="0" x2="0" y2="9" stroke="#b4c2c6" stroke-width="1.6"/></pattern>`;

/** A whole picture: its ground with a faint square grid, and what stands on it. */
export function picture(
  { ground, width, height }: { readonly ground: Ground; readonly width: number; readonly height: number },
  content: string,
): string {
  const { ground: near, far, ink, soft, paper, grid } = INKS[ground];
  const lines = [
    ...Array.from(
      { length: Math.ceil(width / 40) },
      (_none, at) => `M${String(at * 40)} 0V${String(height)}`,
    ),
    ...Array.from(
      { length: Math.ceil(height / 40) },
      (_none, at) => `M0 ${String(at * 40)}H${String(width)}`,
    ),
  ].join('');
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${String(width)}" height="${String(height)}" viewBox="0 0 ${String(width)} ${String(height)}">
<defs>${DEFINITIONS}<radialGradient id="ground" cx="0.45" cy="0.4" r="0.8"><stop offset="0" stop-color="${near}"/><stop offset="1" stop-color="${far}"/></radialGradient></defs>
<style>.edge{stroke:#0b1013;stroke-width:1.5;stroke-linejoin:round}.ink{stroke:${ink};fill:none;stroke-width:1.6}.soft{stroke:${soft};fill:none;stroke-width:1.4}.mark{stroke:#d9a441;fill:none;stroke-width:3}.tip{fill:${ink}}.paper{fill:${paper}}.words{font-family:Karla;font-weight:500;fill:${ink}}.strong{font-family:Karla;font-weight:700;fill:${ink}}.faint{font-family:Karla;font-weight:500;fill:${soft}}.mono{font-family:'Spline Sans Mono';font-weight:500;fill:${ink}}</style>
<rect width="${String(width)}" height="${String(height)}" fill="url(#ground)"/><path d="${lines}" stroke="${grid}" stroke-opacity="0.035" stroke-width="1"/>
${content}</svg>`;
}

const n = (value: number) => String(Math.round(value * 100) / 100);

/** A box filled with one of the definitions or a colour. */
export function box(x: number, y: number, width: number, height: number, fill = 'plate', round = 0): string {
  const paint = fill.startsWith('#') || fill === 'none' ? fill : `url(#${fill})`;
  return `<rect class="edge" x="${n(x)}" y="${n(y)}" width="${n(width)}" height="${n(height)}" rx="${n(round)}" fill="${paint}"/>`;
}

export function shape(path: string, fill = 'plate'): string {
  return `<path class="edge" d="${path}" fill="${fill.startsWith('#') || fill === 'none' ? fill : `url(#${fill})`}"/>`;
}

export function disc(x: number, y: number, radius: number, fill = 'plate'): string {
  return `<circle class="edge" cx="${n(x)}" cy="${n(y)}" r="${n(radius)}" fill="${fill.startsWith('#') || fill === 'none' ? fill : `url(#${fill})`}"/>`;
}

export function line(path: string, kind: 'ink' | 'soft' | 'mark' = 'ink', more = ''): string {
  return `<path class="${kind}" d="${path}" ${more}/>`;
}

/** A centre line: long and short dashes, as drawings have them. */
export function centreLine(x1: number, y1: number, x2: number, y2: number): string {
  return line(`M${n(x1)} ${n(y1)}L${n(x2)} ${n(y2)}`, 'soft', 'stroke-dasharray="22 5 4 5"');
}

export function words(
  x: number,
  y: number,
  text: string,
  { size = 26, kind = 'words', anchor = 'start' }: { size?: number; kind?: string; anchor?: string } = {},
): string {
  const escaped = text.replace(/&/g, '&amp;').replace(/</g, '&lt;');
  return `<text class="${kind}" x="${n(x)}" y="${n(y)}" font-size="${n(size)}" text-anchor="${anchor}">${escaped}</text>`;
}

function arrow(x: number, y: number, angle: number, size = 13): string {
  return `<path class="tip" transform="translate(${n(x)} ${n(y)}) rotate(${n(angle)})" d="M0 0L${n(-size)} ${n(-size / 3.4)}V${n(size / 3.4)}Z"/>`;
}

/** A size between arrow ends. Lying when both ends have one y, upright when they have one x. */
export function dimension(
  x1: number,
  y1: number,
  x2: number,
  y2: number,
  text: string,
  { from = 0, size = 25 }: { from?: number; size?: number } = {},
): string {
  const upright = x1 === x2;
  const wide = text.length * size * 0.6 + 20;
  const [mx, my] = [(x1 + x2) / 2, (y1 + y2) / 2];
  const ends = upright ? arrow(x1, y1, -90) + arrow(x2, y2, 90) : arrow(x1, y1, 180) + arrow(x2, y2, 0);
  // Extension lines reach back to the piece.
  const reach = upright
    ? `M${n(x1 - Math.sign(from) * 8)} ${n(y1)}h${n(from)}M${n(x2 - Math.sign(from) * 8)} ${n(y2)}h${n(from)}`
    : `M${n(x1)} ${n(y1 - Math.sign(from) * 8)}v${n(from)}M${n(x2)} ${n(y2 - Math.sign(from) * 8)}v${n(from)}`;
  return `${line(reach, 'soft')}${line(`M${n(x1)} ${n(y1)}L${n(x2)} ${n(y2)}`)}${ends}<rect class="paper" x="${n(mx - wide / 2)}" y="${n(my - size * 0.72)}" width="${n(wide)}" height="${n(size * 1.44)}"/>${words(mx, my + size * 0.34, text, { size, kind: 'mono', anchor: 'middle' })}`;
}

/** A part's number in its circle, with a leader to the part. Brass while the part is spoken of. */
export function balloon(
  x: number,
  y: number,
  part: string,
  to: readonly [x: number, y: number],
  on: number,
  { inPlans = true, radius = 30 }: { inPlans?: boolean; radius?: number } = {},
): string {
  const angle = Math.atan2(to[1] - y, to[0] - x);
  const [sx, sy] = [x + Math.cos(angle) * radius, y + Math.sin(angle) * radius];
  const bright = on > 0.5;
  const stroke = bright ? '#d9a441' : '#9aa9ae';
  return `<path d="M${n(sx)} ${n(sy)}L${n(to[0])} ${n(to[1])}" stroke="${stroke}" stroke-width="2.4"/><circle cx="${n(to[0])}" cy="${n(to[1])}" r="4.5" fill="${stroke}"/><circle cx="${n(x)}" cy="${n(y)}" r="${n(radius)}" fill="${bright ? '#d9a441' : '#141b1f'}" stroke="${bright ? '#f6ecd6' : '#e6ecea'}" stroke-width="2.4" ${inPlans ? '' : 'stroke-dasharray="6 4"'}/><text font-family="Spline Sans Mono" font-weight="600" font-size="${n(radius * 0.8)}" x="${n(x)}" y="${n(y + radius * 0.28)}" text-anchor="middle" fill="${bright ? '#1a2024' : '#e6ecea'}">${part}</text>`;
}

/** A caution on the picture itself: a red-oxide plate with a few words, top right. */
export function warning(text: string): string {
  const wide = text.length * 13.4 + 92;
  const [x, y] = [1240 - wide, 34];
  return `<rect x="${n(x)}" y="${n(y)}" width="${n(wide)}" height="58" fill="#a2391f"/><path d="M${n(x + 20)} ${n(y + 44)}l17 -30l17 30z" fill="none" stroke="#f7e4de" stroke-width="3" stroke-linejoin="round"/><path d="M${n(x + 37)} ${n(y + 25)}v9m0 4v2" stroke="#f7e4de" stroke-width="3"/><text font-family="Karla" font-weight="700" font-size="27" x="${n(x + 68)}" y="${n(y + 38)}" fill="#ffffff">${text}</text>`;
}

/** A plain plate with a line of words, for what is said on the picture. */
export function label(x: number, y: number, text: string, tone: 'brass' | 'plain' | 'dye' = 'plain'): string {
  const fill = { brass: '#d9a441', plain: '#f2f5f4', dye: '#202c82' }[tone];
  return `<rect x="${n(x)}" y="${n(y)}" width="${n(text.length * 13.4 + 40)}" height="52" fill="${fill}"/><text font-family="Karla" font-weight="700" font-size="26" x="${n(x + 20)}" y="${n(y + 35)}" fill="${tone === 'dye' ? '#ffffff' : '#1a2024'}">${text.replace(/&/g, '&amp;')}</text>`;
}

/** A revision's or a change's triangle with its letter. */
export function triangle(x: number, y: number, letter: string): string {
  return `<path d="M${n(x)} ${n(y)}l30 -52l30 52z" fill="#f6ecd6" stroke="#d9a441" stroke-width="4" stroke-linejoin="round"/><text font-family="Spline Sans Mono" font-weight="600" font-size="24" x="${n(x + 30)}" y="${n(y - 9)}" text-anchor="middle" fill="#8a6112">${letter}</text>`;
}

/** The mark of the punch: a dot in a ring with hairlines. */
export function centrePop(x: number, y: number, radius = 12): string {
  return `<g stroke="#d9a441" stroke-width="1.6" fill="none"><circle cx="${n(x)}" cy="${n(y)}" r="${n(radius)}"/><path d="M${n(x - radius * 2)} ${n(y)}h${n(radius * 4)}M${n(x)} ${n(y - radius * 2)}v${n(radius * 4)}"/></g><circle cx="${n(x)}" cy="${n(y)}" r="${n(radius / 3.4)}" fill="#d9a441"/>`;
}

/** A force or a movement: a thick arrow from one point to another. */
export function push(x1: number, y1: number, x2: number, y2: number, colour = '#d9a441'): string {
  const angle = (Math.atan2(y2 - y1, x2 - x1) * 180) / Math.PI;
  const length = Math.hypot(x2 - x1, y2 - y1);
  return `<path transform="translate(${n(x1)} ${n(y1)}) rotate(${n(angle)})" d="M0 -7H${n(length - 26)}V-19L${n(length)} 0L${n(length - 26)} 19V7H0Z" fill="${colour}"/>`;
}

export function group(
  content: string,
  { opacity = 1, move = '' }: { opacity?: number; move?: string } = {},
): string {
  if (opacity <= 0.01) return '';
  return `<g ${opacity < 1 ? `opacity="${n(opacity)}"` : ''} ${move === '' ? '' : `transform="${move}"`}>${content}</g>`;
}

/** What a camera sees that looks at (x, y) through a magnification. */
export function seen(content: string, x: number, y: number, zoom: number): string {
  return group(content, { move: `translate(640 372) scale(${n(zoom)}) translate(${n(-x)} ${n(-y)})` });
}
