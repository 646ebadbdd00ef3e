import { seatsWorksheet } from '../../../../domain/fits/seats-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';
import { FitPicture } from './FitPicture.tsx';

/** The seats of a bearing. */
export function SeatsSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={seatsWorksheet}

      example={{ bore: '25', outside: '52', shaft: 'k6', housing: 'H7', turning: 'inner' }}
      picture={({ result: { inner, outer, usualShaft, usualHousing } }) => (
        <>
          <p>
            Usual for a load that turns so: shaft {usualShaft}, housing {usualHousing}.
          </p>
          <div className="grid gap-4 xl:grid-cols-2">
            <FitPicture
              title="Bore of the bearing on its shaft"
              bands={[
                { label: 'bearing', deviations: inner.bearing, fill: 'fill-dye-wash' },
                { label: 'shaft', deviations: inner.seat, fill: 'fill-brass-wash' },
              ]}
            />
            <FitPicture
              title="Bearing in its housing"
              bands={[
                { label: 'housing', deviations: outer.seat, fill: 'fill-dye-wash' },
                { label: 'bearing', deviations: outer.bearing, fill: 'fill-brass-wash' },
              ]}
            />
          </div>
        </>
      )}
    />
  );
}
