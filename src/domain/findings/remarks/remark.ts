import { type FindingKind } from '../finding.ts';
import { phrase, type Speech, wordOfOffset } from '../speech/speech.ts';

/** A way in which something is said. */
export interface Saying {
  readonly rule: string;
  readonly pattern: RegExp;
  /** What the words around must not hold: it is something else then. */
  readonly unless?: RegExp;
  readonly sure: number;
}

/** Something that was said, from a word up to, not including, another. */
export interface Remark {
  readonly kind: FindingKind;
  readonly from: number;
  readonly to: number;
  readonly rule: string;
  readonly sure: number;
}

/** A saying: words in a pattern, between word borders. */
export function saying(rule: string, pattern: string, sure = 0.8, unless?: RegExp): Saying {
  return {
    rule,
    pattern: new RegExp(`(?<= |^)(?:${pattern})(?= |$)`, 'g'),
    sure,
    ...(unless === undefined ? {} : { unless }),
  };
}

/** Words looked at before and behind a saying for what makes something else of it. */
const AROUND = 6;

/** Every place where one of the sayings is found, in order; one said again within a few words is the same remark. */
export function findRemarks(
  speech: Speech,
  kind: FindingKind,
  sayings: readonly Saying[],
  apart: number,
): Remark[] {
  const found: Remark[] = [];
  for (const { rule, pattern, unless, sure } of sayings)
    for (const match of speech.text.matchAll(pattern)) {
      const from = wordOfOffset(speech, match.index);
      const to = wordOfOffset(speech, match.index + Math.max(0, match[0].length - 1)) + 1;
      if (unless?.test(phrase(speech, from - AROUND, to + AROUND)) === true) continue;
      if (crossesSentences(speech, from, to)) continue;
      found.push({ kind, from, to, rule, sure });
    }
  return joinRemarks(found, apart);
}

/** Remarks in order, those of them that stand within a few words taken for one. */
export function joinRemarks(found: readonly Remark[], apart: number): Remark[] {
  const kept: Remark[] = [];
  for (const remark of [...found].sort((a, b) => a.from - b.from || b.to - a.to)) {
    const last = kept.at(-1);
    if (last !== undefined && remark.from - last.to <= apart) {
      kept[kept.length - 1] = {
        ...last,
        to: Math.max(last.to, remark.to),
        sure: Math.max(last.sure, remark.sure),
      };
    } else kept.push(remark);
  }
  return kept;
}

/** Two sentences may make one remark, three do not. */
function crossesSentences(speech: Speech, from: number, to: number): boolean {
  let stops = 0;
  for (let word = from; word < to - 1; word++) if (speech.words[word]?.stop === '.') stops++;
  return stops > 1;
}
