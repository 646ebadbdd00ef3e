import { balloon, box, dimension, disc, group, line, push, shape, words } from './drawing.ts';
import { type Film, type Shot } from './film.ts';

/** The belt guard from the front with the belt behind it, 1.9 px a millimetre. */
export function guard(x: number, y: number, lifted: number): string {
  const belt = [
    `<path d="M${String(x - 190)} ${String(y - 190)}L${String(x + 300)} ${String(y - 74)}M${String(x - 190)} ${String(y + 190)}L${String(x + 300)} ${String(y + 74)}" stroke="#15191b" stroke-width="22"/>`,
    disc(x - 190, y, 190, 'dark-plate'),
    disc(x - 190, y, 172, 'plate'),
    disc(x - 190, y, 46, 'bright'),
    disc(x + 300, y, 76, 'plate'),
    disc(x + 300, y, 26, 'bright'),
  ].join('');
  const cover = group(
    [
      shape(`M${String(x - 456)} ${String(y - 247)}h912v494h-912z`, 'stainless'),
      line(`M${String(x - 440)} ${String(y - 231)}h880v462h-880z`, 'soft', 'stroke="#6c7977"'),
      ...Array.from({ length: 13 }, (_none, index) =>
        box(x - 360 + index * 58, y - 120, 26, 240, '#2a3439', 13),
      ),
      box(x - 470, y + 262, 90, 46, 'plate'),
      box(x + 380, y + 262, 90, 46, 'plate'),
      box(x - 446, y + 272, 42, 24, '#10161a', 12),
      box(x + 404, y + 272, 42, 24, '#10161a', 12),
    ].join(''),
    { opacity: 0.94, move: `translate(0 ${String(-lifted)})` },
  );
  return belt + cover;
}

/** The corners and the number of a camera's viewfinder: the clip is known as one. */
const clipMarks = `${line('M40 90V40h50M1240 90V40h-50M40 630v50h50M1240 630v50h-50', 'ink', 'stroke-width="3"')}${words(110, 66, 'C0043', { size: 24, kind: 'mono' })}`;

const beltGuard: Shot = {
  chapter: '',
  cues: [
    {
      text: 'right this is the belt guard, one two three, 480 by 260 in one and a half mil sheet',
      say: 'Right. This is the belt guard, one two three. Four eighty by two sixty, in one and a half mil sheet.',
    },
    {
      text: 'it hangs on two slots, fourteen long, so you can tension the belt with the guard on',
      say: 'It hangs on two slots, fourteen long, so you can tension the belt with the guard on.',
    },
    {
      text: 'pulley is 122, two hundred mil, and the motor wants to do about 560 turns at the drum',
      say: 'Pulley is one twenty two, two hundred mil. And the motor wants to do about five hundred and sixty turns at the drum.',
    },
    {
      text: 'nothing turns under power until this is on, ever',
      say: 'Nothing turns under power until this is on. Ever.',
    },
    {
      text: "i don't know yet if I paint it or leave it bright",
      say: "I don't know yet, if I paint it, or leave it bright.",
    },
    {
      text: 'and the bracket at the back I will weld off camera',
      say: 'And the bracket at the back, I will weld off camera.',
    },
  ],
  draw: ({ at, come, on }) => {
    const lifted = 520 * come(2, -0.2, 1) * (1 - come(3, -0.3, 1));
    const close = come(1, -0.2, 1) * (1 - come(2, -0.3, 1));
    const sway = Math.sin(at * 0.5) * 4;
    const scene = group(guard(640, 350, lifted), {
      move: `translate(${String(640 + sway)} 372) scale(${String(0.82 + 0.9 * close)}) translate(${String(-640 + 300 * close)} ${String(-350 - 190 * close)})`,
    });
    return [
      scene,
      group(balloon(1150, 200, '123', [990, 260], on(0, 1, 3)), {
        opacity: come(0, 0.6) * (1 - close) * (1 - come(2)) + come(3),
      }),
      group(dimension(266, 118, 1014, 118, '480 mm', { from: 40 }), {
        opacity: come(0, 2.4) * (1 - close) * (1 - come(2, -0.2)),
      }),
      group(dimension(196, 188, 196, 520, '260 mm', { from: 60 }), {
        opacity: come(0, 3.4) * (1 - close) * (1 - come(2, -0.2)),
      }),
      group(balloon(160, 560, '122', [400, 480], on(2)), { opacity: come(2, 0.8) * (1 - come(3, -0.2)) }),
      group(push(1060, 300, 1060, 420, '#9aa9ae'), { opacity: come(2, 1.6) * (1 - come(3, -0.2)) }),
      clipMarks,
    ].join('');
  },
};

export const CLIP: Film = {
  file: 'C0043.MOV',
  captions: 'C0043.vtt',
  episode: null,
  tags: { creation_time: '2026-11-24T14:22:07Z' },
  shots: [beltGuard],
};
