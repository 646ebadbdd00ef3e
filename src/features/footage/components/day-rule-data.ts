import { type NoteKind } from '../../../components/note-kind.ts';
import { type FootageDay } from '../day.ts';

/** What stands on a day's rule. Times are milliseconds since 1970. */
export interface DayRuleData {
  readonly timeZone: string;
  readonly from: number;
  readonly until: number;
  readonly lanes: readonly {
    readonly name: string;
    readonly clips: readonly {
      readonly id: string;
      readonly name: string;
      readonly from: number;
      readonly until: number;
      readonly href: string;
      /** Time-lapse and slow motion are drawn dashed. */
      readonly dashed: boolean;
    }[];
  }[];
  readonly pops: readonly {
    readonly id: string;
    readonly at: number;
    readonly kind: NoteKind;
    readonly label: string;
    readonly href: string;
  }[];
  readonly gaps: readonly { readonly from: number; readonly until: number }[];
  /** Work with the camera off. */
  readonly hatchings: readonly { readonly from: number; readonly until: number; readonly label: string }[];
}

const HOUR_MS = 3_600_000;

type Drawn = Pick<FootageDay, 'clips' | 'stretches' | 'gaps'> & {
  readonly timeZone: string;
  readonly pops: DayRuleData['pops'];
  /** Where a stretch that still runs has come to. */
  readonly now: number;
  readonly clipHref: (clip: string) => string;
};

/** A day of footage as its rule shows it: a lane a camera; null when nothing of it has a time. */
export function drawDay({
  clips,
  stretches,
  gaps,
  pops,
  timeZone,
  now,
  clipHref,
}: Drawn): DayRuleData | null {
  const ran = clips.flatMap(({ from, until, ...clip }) =>
    from === null || until === null ? [] : [{ ...clip, from, until }],
  );
  const hatchings = stretches.map(({ from, until, text }) => ({ from, until: until ?? now, label: text }));
  const span = spanOf([
    ...[...ran, ...hatchings].flatMap(({ from, until }) => [from, until]),
    ...pops.map(({ at }) => at),
  ]);
  if (span === null) return null;
  const lanes = [...new Set(ran.map(({ camera }) => camera?.id))].map((id) => {
    const own = ran.filter(({ camera }) => camera?.id === id);
    return {
      name: own[0]?.camera?.name ?? 'no camera',
      clips: own.map(({ id: clip, name, from, until, pace }) => ({
        id: clip,
        name,
        from,
        until,
        href: clipHref(clip),
        dashed: pace.num !== pace.den,
      })),
    };
  });
  return { timeZone, ...span, lanes, pops, gaps, hatchings };
}

/** The whole hours around all that a day has to show; null when there is nothing. */
function spanOf(times: readonly number[]): { from: number; until: number } | null {
  if (times.length === 0) return null;
  const from = Math.floor(Math.min(...times) / HOUR_MS) * HOUR_MS;
  const until = Math.ceil((Math.max(...times) + 1) / HOUR_MS) * HOUR_MS;
  return { from, until };
}

/** Up to so long a day there is room for the number of every quarter of an hour. Our own choice. */
const ROOM_FOR_QUARTERS_MS = 3 * HOUR_MS;

/** Where the lines of a rule stand: every quarter of an hour; what stands at each, where there is room for it. */
export function graduateDay({ from, until, timeZone }: Pick<DayRuleData, 'from' | 'until' | 'timeZone'>): {
  at: number;
  isHour: boolean;
  label: string | null;
}[] {
  const lines: { at: number; isHour: boolean; label: string | null }[] = [];
  const quarters = until - from <= ROOM_FOR_QUARTERS_MS;
  const clock = new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit' });
  for (let at = from; at <= until; at += HOUR_MS / 4) {
    const text = clock.format(at);
    const isHour = text.endsWith(':00');
    lines.push({ at, isHour, label: isHour || quarters ? text.replace(/^0/, '') : null });
  }
  return lines;
}
