import { type BeamCase } from '../../../../domain/beam/bend.ts';
import { beamWorksheet } from '../../../../domain/beam/beam-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';

const CASES: Record<BeamCase, string> = {
  'simple-centre': 'on two supports, loaded in the middle',
  'simple-uniform': 'on two supports, loaded evenly',
  'cantilever-end': 'built in at one end, loaded at the other',
  'cantilever-uniform': 'built in at one end, loaded evenly',
};

function isCase(text: string | undefined): text is BeamCase {
  return text !== undefined && text in CASES;
}

const [LEFT, RIGHT, LINE] = [40, 380, 70] as const;

function Arrows({ at }: { readonly at: readonly number[] }) {
  return at.map((x) => (
    <path
      key={x}
      d={`M${String(x)} 22V${String(LINE - 8)}m-4 -9l4 9l4 -9`}
      className="fill-none stroke-primer"
    />
  ));
}

/** The beam as it is held and loaded; not to scale. */
function BeamPicture({ held }: { readonly held: BeamCase }) {
  const simple = held.startsWith('simple');
  const even = held.endsWith('uniform');
  const middle = (LEFT + RIGHT) / 2;
  const evenly = Array.from({ length: 9 }, (_, index) => LEFT + ((RIGHT - LEFT) * index) / 8);
  return (
    <figure className="max-w-lg border border-line bg-sheet p-3">
      <svg viewBox="0 0 420 130" role="img" aria-label={`A beam ${CASES[held]}`} className="w-full">
        {even && <path d={`M${String(LEFT)} 22H${String(RIGHT)}`} className="stroke-primer" />}
        <Arrows at={even ? evenly : [simple ? middle : RIGHT]} />
        <rect x={LEFT} y={LINE - 6} width={RIGHT - LEFT} height="12" className="fill-dye-wash stroke-ink" />
        {simple ? (
          [LEFT, RIGHT].map((x) => (
            <path
              key={x}
              d={`M${String(x)} ${String(LINE + 6)}l-10 18h20z`}
              className="fill-sheet stroke-ink"
            />
          ))
        ) : (
          <path
            d={`M${String(LEFT)} ${String(LINE - 30)}v60m0 -60l-12 8m12 7l-12 8m12 7l-12 8m12 7l-12 8m12 7l-12 8`}
            className="fill-none stroke-ink"
          />
        )}
        <path
          d={`M${String(LEFT)} 112H${String(RIGHT)}M${String(LEFT)} 106v12M${String(RIGHT)} 106v12`}
          className="stroke-ink"
        />
        <text x={middle} y="107" textAnchor="middle" className="fill-ink font-mono text-[12px]">
          span
        </text>
      </svg>
      <figcaption className="text-sm text-ink-soft">A beam {CASES[held]}. Not to scale.</figcaption>
    </figure>
  );
}

/** A simple beam or cantilever. */
export function BeamSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={beamWorksheet}
      example={{ case: 'simple-centre', span: '1200', load: '2 kN', bar: '12x50' }}
      picture={(_worked, typed) => isCase(typed['case']) && <BeamPicture held={typed['case']} />}
    />
  );
}
