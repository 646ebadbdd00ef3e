/** Where on the desk a check is put right. */
export type CheckSection = 'details' | 'video' | 'edit' | 'chapters' | 'captions' | 'notes' | 'parts';

/**
 * One line of “Before it goes out”. must: it holds before the episode is asked for or goes out; should: the
 * owner decides.
 */
export interface PublishCheck {
  readonly id: string;
  readonly level: 'must' | 'should';
  readonly holds: boolean;
  readonly sentence: string;
  readonly place: {
    readonly section: CheckSection;
    /** The notes or parts that it is about, in the order of the episode. */
    readonly ids: readonly string[];
  };
}

/** Whether nothing that must hold is missing. */
export function mayGoOut(checks: readonly PublishCheck[]): boolean {
  return checks.every((check) => check.holds || check.level === 'should');
}
