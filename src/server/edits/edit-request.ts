import { type Rate } from '../../domain/time/rate.ts';

/** What the process that waits for an edit asks of the one that reads it. */
export interface EditRequest {
  readonly text: string;
  readonly rate: Rate | null;
  readonly clipRates: readonly (readonly [string, Rate])[];
}
