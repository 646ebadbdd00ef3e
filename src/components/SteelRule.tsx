import { formatClock } from './rule/clock.ts';
import { LyingRule } from './rule/LyingRule.tsx';
import { type RuleData } from './rule/rule-data.ts';
import { RuleList } from './rule/RuleList.tsx';
import { type RulePosition, UprightRule } from './rule/UprightRule.tsx';

type SteelRuleProps = RuleData &
  (
    | { readonly orientation?: 'lying' | undefined }
    | {
        readonly orientation: 'upright';
        /** Pixels from the tape's top to each note beside it, in the order of time. */
        readonly positions: readonly RulePosition[];
        readonly height: number;
      }
  );

/**
 * An episode's time as a steel rule. Lying, it fits any width from about 320 px without a script. Upright,
 * it follows the notes beside it; where their places are not known beforehand, use a TapePiece a note.
 * Whatever moves with the video carries `data-rule-now`; marks carry `data-at` in seconds.
 */
export function SteelRule(props: SteelRuleProps) {
  const empty = !(props.length > 0);
  return (
    <div role="group" aria-label={`Time rule, ${formatClock(props.length)} long`} data-length={props.length}>
      {empty ? null : props.orientation === 'upright' ? <UprightRule {...props} /> : <LyingRule {...props} />}
      {props.quiet !== true && <RuleList {...props} />}
    </div>
  );
}
