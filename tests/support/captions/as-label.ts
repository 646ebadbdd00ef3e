import { type Finding } from '../../../src/domain/findings/finding.ts';
import { type Label } from './labelled-set.ts';

/** A finding with the fields that a label has. */
export function asLabel({ kind, span, part, what, text, topic, values }: Finding): Label {
  return {
    cue: span.from.cue,
    kind,
    ...(kind === 'part' && part !== null ? { part } : {}),
    ...(what === undefined ? {} : { what }),
    ...(text === undefined ? {} : { text }),
    ...(topic === undefined ? {} : { topic }),
    ...(values === undefined ? {} : { values }),
  };
}
