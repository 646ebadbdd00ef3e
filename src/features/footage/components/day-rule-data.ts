import { type NoteKind } from '../../../components/note-kind.ts';

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

/** The whole hours around all that a day has to show; null when there is nothing. */
export function spanOf(times: readonly number[]): { from: number; until: number } | null {
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
