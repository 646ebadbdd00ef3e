import { formatNumber } from '../../../../domain/quantities/format-number.ts';
import { type FitResult, fitWorksheet } from '../../../../domain/fits/fit-worksheet.ts';
import { type TakeOff } from '../../../../domain/fits/take-off.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';
import { FitPicture } from './FitPicture.tsx';

const FITS = {
  clearance: 'A clearance fit: they always go together.',
  transition: 'A transition fit: it may come out loose or tight.',
  interference: 'An interference fit: it is always tight.',
} as const;

function StillToComeOff({ verdict, aim, onDiameter, onDial }: TakeOff) {
  const off = Math.abs(onDiameter);
  return (
    <div className="border-s-4 border-brass ps-3">
      <p>
        <strong>
          {verdict === 'can’t tell with this'
            ? 'Can’t tell with this instrument'
            : `It is ${verdict} its limits`}
        </strong>
        {onDiameter > 0
          ? `: ${formatNumber(off, 4)} mm to come off on diameter for the middle of the limits.`
          : `: the middle of the limits lies ${formatNumber(off, 4)} mm back.`}
      </p>
      <p className="font-mono text-sm">
        Aim {formatNumber(aim, 7)} mm · on this dial {formatNumber(onDial, 4)} mm
      </p>
    </div>
  );
}

function Picture({ result: { hole, shaft, fit, takeOff } }: { readonly result: FitResult }) {
  const bands = [
    ...(hole === null ? [] : [{ label: 'hole', deviations: hole, fill: 'fill-dye-wash' }]),
    ...(shaft === null ? [] : [{ label: 'shaft', deviations: shaft, fill: 'fill-brass-wash' }]),
  ];
  return (
    <>
      {fit !== null && <p className="font-bold">{FITS[fit.kind]}</p>}
      {takeOff !== null && <StillToComeOff {...takeOff} />}
      <FitPicture title="Limits about the nominal size" bands={bands} />
    </>
  );
}

/** Limits and fits. */
export function FitsSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={fitWorksheet}

      example={{ size: '25', hole: 'H7', shaft: 'k6' }}
      picture={({ result }) => <Picture result={result} />}
    />
  );
}
