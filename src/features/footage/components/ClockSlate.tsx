import { useEffect, useState } from 'react';
import { encode } from 'uqr';
import { writeSlateCode } from '../../../domain/footage/slate-code.ts';
import { wallIn } from '../../../domain/time/wall-time.ts';

interface ClockSlateProps {
  /** An IANA name. */
  readonly timeZone: string;
  /** When the server made the page, in milliseconds since 1970. */
  readonly serverNow: number;
}

/** A frame of film is 20 to 42 ms; the code has to stand still for several. */
const EVERY_MS = 200;
/** More than making and loading a page takes. Our own choice. */
const TOO_FAR_MS = 5_000;

/** Shop time, large, with its code: filmed, it tells what a camera's clock is off by. */
export function ClockSlate({ timeZone, serverNow }: ClockSlateProps) {
  const [at, setAt] = useState<number | null>(null);
  const [off, setOff] = useState(false);
  useEffect(() => {
    const opened = Date.now();
    const timer = setInterval(() => {
      setAt(Date.now());
      setOff(Math.abs(opened - serverNow) > TOO_FAR_MS);
    }, EVERY_MS);
    return () => {
      clearInterval(timer);
    };
  }, [serverNow]);
  const wall = at === null ? null : wallIn(timeZone, at);
  return (
    <div className="grid justify-items-center gap-4 text-center">
      <p className="font-mono text-lg">{wall?.slice(0, 10) ?? ' '}</p>
      <p
        className="font-mono text-6xl font-bold tabular-nums sm:text-8xl"
        role="timer"
        aria-label="Shop time"
      >
        {wall?.slice(11) ?? '--:--:--'}
        <span className="text-3xl sm:text-5xl">.{at === null ? '-' : Math.floor((at % 1000) / 100)}</span>
      </p>
      <p className="text-sm">{timeZone}</p>
      <Code at={at ?? serverNow} />
      {off && (
        <p role="alert" className="max-w-prose border border-brass px-4 py-2">
          This phone’s clock differs from ours by more than five seconds. Set it to automatic time first, then
          open the slate again.
        </p>
      )}
    </div>
  );
}

function Code({ at }: { readonly at: number }) {
  // Black on white with the quiet zone of four modules that ISO/IEC 18004 asks for.
  const { data, size } = encode(writeSlateCode(at), { ecc: 'H', border: 4 });
  const path = data
    .flatMap((row, y) => row.map((dark, x) => (dark ? `M${String(x)} ${String(y)}h1v1h-1z` : '')))
    .join('');
  return (
    <svg
      role="img"
      aria-label="Shop time as a code"
      viewBox={`0 0 ${String(size)} ${String(size)}`}
      shapeRendering="crispEdges"
      className="w-full max-w-80"
    >
      <rect width={size} height={size} fill="#fff" />
      <path d={path} fill="#000" />
    </svg>
  );
}
