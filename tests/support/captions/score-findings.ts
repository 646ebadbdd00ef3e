import { type Label } from './labelled-set.ts';

/** How many labels were found, how many there are, how many were found that are none, by kind and over all. */
export interface Score {
  readonly precision: number;
  readonly recall: number;
  readonly f1: number;
  readonly missed: readonly Label[];
  readonly extra: readonly Label[];
}

const CUE_ONLY: ReadonlySet<string> = new Set(['change', 'undecided', 'ask', 'unfilmed', 'arrival']);

/** The rules of the labelled sets: kind, caption give or take one, and fields agree, numbers to 0.1 %. */
export function scoreFindings(labels: readonly Label[], findings: readonly Label[]): Score {
  const left = new Set(findings);
  const missed = labels.filter((label) => {
    const [best] = [...left]
      .filter((finding) => agree(label, finding))
      .sort((a, b) => Math.abs(a.cue - label.cue) - Math.abs(b.cue - label.cue));
    if (best !== undefined) left.delete(best);
    return best === undefined;
  });
  const hits = labels.length - missed.length;
  const precision = hits / Math.max(1, findings.length);
  const recall = hits / Math.max(1, labels.length);
  return {
    precision,
    recall,
    f1: (2 * hits) / Math.max(1, labels.length + findings.length),
    missed,
    extra: [...left],
  };
}

function agree(label: Label, finding: Label): boolean {
  if (label.kind !== finding.kind || Math.abs(label.cue - finding.cue) > 1) return false;
  if (CUE_ONLY.has(label.kind)) return true;
  if (label.kind === 'part') return label.part?.toLowerCase() === finding.part?.toLowerCase();
  if (label.kind === 'caution') return label.topic === finding.topic;
  if (label.what !== finding.what) return false;
  if (label.text !== undefined) return label.text.toLowerCase() === finding.text?.toLowerCase();
  const [ours = [], theirs = []] = [label.values, finding.values];
  return ours.length === theirs.length && ours.every((value, index) => same(value, theirs[index]));
}

type Value = NonNullable<Label['values']>[number];

function same(one: Value, other: Value | undefined): boolean {
  if (other === undefined || one.unit !== other.unit) return false;
  if (typeof one.value === 'number' && typeof other.value === 'number')
    return (
      Math.abs(one.value - other.value) <= 1e-3 * Math.max(Math.abs(one.value), Math.abs(other.value), 1e-9)
    );
  const plain = (value: number | string) => String(value).replace(/\s+/g, ' ').toLowerCase();
  return plain(one.value) === plain(other.value);
}
