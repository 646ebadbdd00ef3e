import Fraction from 'fraction.js';
import { type Cue } from '../captions/cue.ts';
import { findCorrections } from './corrections.ts';
import { type Dialect, type Finding, type ListedPart, type SpokenValue, type WordSpan } from './finding.ts';
import { findParts, indexParts, letteredCode, type Mention } from './parts/find-parts.ts';
import { findCautions } from './remarks/cautions.ts';
import { CHANGES } from './remarks/changes.ts';
import { findRemarks, joinRemarks, type Remark } from './remarks/remark.ts';
import { ARRIVALS, ASKS, CAME, UNDECIDED, UNFILMED } from './remarks/sayings.ts';
import { readSpeech } from './speech/read-speech.ts';
import { after, type Speech } from './speech/speech.ts';
import { type Claim } from './values/claim.ts';
import { findValues, hearValues } from './values/find-values.ts';
import { readShop } from './values/read-shop.ts';
import { inSi } from './values/si.ts';

/** How far back, in words, the part stands that a value belongs to. Our own: a sentence or two. */
const ABOUT = 30;

/**
 * What a careful person would note from captions: parts, sizes, settings, ratings, cautions, changes and the rest,
 * each with its words, the rule that found it and how sure that is. The same captions always give the same findings.
 * @param cues in any order; a finding names its caption by its place in this list
 * @param parts of the build
 * @returns in the order in which they are spoken
 */
export function readFindings(
  cues: readonly Cue[],
  parts: readonly ListedPart[],
  dialect: Dialect = {},
): Finding[] {
  const speech = readSpeech(cues);
  const index = indexParts(parts);
  const heard = hearValues(speech, dialect, (word) => letteredCode(speech, word, index));
  const mentions = findParts(speech, index, (word) => heard.taken.has(word));
  const spoken = new Set<number>();
  for (const { from, to } of mentions) for (let word = from; word < to; word++) spoken.add(word);
  const shop = readShop(heard.measures, heard.named, dialect);
  const claims = findValues(speech, heard, shop, (word) => spoken.has(word));
  const remarks = [
    ...findRemarks(speech, 'change', CHANGES, 20),
    ...findRemarks(speech, 'undecided', UNDECIDED, 20),
    ...findRemarks(speech, 'ask', ASKS, 25),
    ...findRemarks(speech, 'unfilmed', UNFILMED, 25),
    ...joinRemarks([...findRemarks(speech, 'arrival', ARRIVALS, 15), ...findCome(speech, mentions)], 15),
  ];
  const about = aboutPart(mentions);
  const findings: (Finding & { readonly at: number })[] = [
    ...mentions.map(({ part, from, to, rule, sure }) => ({
      kind: 'part' as const,
      part,
      span: spanOf(speech, cues, from, to),
      rule,
      sure,
      at: from,
    })),
    ...claims.map((claim) => ({
      ...valueFinding(speech, cues, claim, dialect),
      part: about(claim.from),
      at: claim.from,
    })),
    ...findCorrections(claims, parts, about).map(({ claim, part, sentence }) => ({
      ...valueFinding(speech, cues, claim, dialect),
      kind: 'correction' as const,
      part,
      sentence,
      rule: 'size of the parts list',
      sure: 0.5,
      at: claim.from,
    })),
    ...[...remarks, ...findCautions(speech)].map(({ from, to, ...remark }) => ({
      ...remark,
      span: spanOf(speech, cues, from, to),
      part: about(from),
      at: from,
    })),
  ];
  return findings.sort((a, b) => a.at - b.at).map(({ at: _at, ...finding }) => finding);
}

function valueFinding(
  speech: Speech,
  cues: readonly Cue[],
  claim: Claim,
  dialect: Dialect,
): Omit<Finding, 'part'> {
  const { kind, from, to, what, text, rule, sure } = claim;
  return {
    kind,
    span: spanOf(speech, cues, from, to),
    ...(text === undefined ? { values: claim.values.map((value) => spokenValue(value, dialect)) } : { text }),
    ...(what === undefined ? {} : { what }),
    rule,
    sure,
  };
}

function spokenValue({ value, unit }: Claim['values'][number], dialect: Dialect): SpokenValue {
  if (!(value instanceof Fraction)) return { value, unit, exact: null, si: null };
  const si = inSi(value, unit, dialect);
  return {
    value: value.valueOf(),
    unit,
    exact: value.toFraction(),
    si: si === null ? null : { value: si.value.toFraction(), unit: si.unit },
  };
}

/** A part's name and that it came. */
function findCome(speech: Speech, mentions: readonly Mention[]): Remark[] {
  return mentions.flatMap(({ to, by }) => {
    const come = by === 'name' ? CAME.exec(after(speech, to, 6)) : null;
    const length = come?.[0].split(' ').length ?? 0;
    return come === null
      ? []
      : [{ kind: 'arrival' as const, from: to, to: to + length, rule: 'a part came', sure: 0.75 }];
  });
}

/** The part that was last spoken of before a word, if that was not long ago. */
function aboutPart(mentions: readonly Mention[]): (word: number) => string | null {
  return (word) => {
    let low = 0;
    let high = mentions.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((mentions[middle]?.from ?? 0) <= word) low = middle + 1;
      else high = middle;
    }
    const last = mentions[low - 1];
    return last === undefined || word - last.to > ABOUT ? null : last.part;
  };
}

function spanOf(speech: Speech, cues: readonly Cue[], from: number, to: number): WordSpan {
  const first = speech.words[from];
  const last = speech.words[to - 1] ?? first;
  if (first === undefined || last === undefined) throw new RangeError('A finding has words.');
  const text = (cue: number) => cues[cue]?.lines.join('\n') ?? '';
  const words =
    first.cue === last.cue
      ? text(first.cue).slice(first.from, last.to)
      : `${text(first.cue).slice(first.from)} ${text(last.cue).slice(0, last.to)}`;
  return {
    from: { cue: first.cue + 1, character: first.from },
    to: { cue: last.cue + 1, character: last.to },
    seconds: [first.start, last.end],
    words: words.replace(/\s+/g, ' '),
  };
}
