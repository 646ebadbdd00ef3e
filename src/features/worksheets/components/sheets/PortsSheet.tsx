import { type PortCandidate, portsWorksheet } from '../../../../domain/ports/ports-worksheet.ts';
import { formatNumber } from '../../../../domain/quantities/format-number.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';

function Candidate(candidate: PortCandidate) {
  const { name, standard, side, sure, differenceMm, pitch, angle, tapered, seals, mates, neverWith } =
    candidate;
  const facts = [
    `${side} thread`,
    pitch,
    `${String(angle)}°`,
    tapered ? 'tapered' : 'parallel',
    `reads ${differenceMm === 0 ? 'as nominal' : `${formatNumber(Math.abs(differenceMm), 2)} mm ${differenceMm > 0 ? 'over' : 'under'} nominal`}`,
  ];
  return (
    <li className="grid gap-2 border border-line bg-sheet px-4 py-3">
      <div className="flex flex-wrap items-baseline gap-x-3">
        <h2 className="font-mono text-lg">{name}</h2>
        <span className="text-sm text-ink-soft">{standard}</span>
        <span className="border border-ink px-2 text-sm font-medium">{sure}</span>
      </div>
      <p className="font-mono text-sm">{facts.join(' · ')}</p>
      <p>
        <strong>Seals:</strong> {seals} <strong>Mates with:</strong> {mates}
      </p>
      {neverWith.length > 0 && (
        <div className="border-s-4 border-primer ps-3">
          <p className="font-bold text-primer">Never mate it with</p>
          <ul>
            {neverWith.map(({ name: other, why }) => (
              <li key={other}>
                <span className="font-mono font-semibold">{other}</span>: {why}
              </li>
            ))}
          </ul>
        </div>
      )}
    </li>
  );
}

/** Which thread a port has. */
export function PortsSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={portsWorksheet}

      example={{ diameter: '16.6', pitch: '19 tpi', side: 'external' }}
      picture={({ result: { candidates } }) =>
        candidates.length > 0 && (
          <ul className="grid gap-3">
            {candidates.map((candidate) => (
              <Candidate key={`${candidate.name} ${candidate.side}`} {...candidate} />
            ))}
          </ul>
        )
      }
    />
  );
}
