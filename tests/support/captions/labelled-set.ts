import { readFileSync } from 'node:fs';
import { type Cue } from '../../../src/domain/captions/cue.ts';
import { type ListedPart } from '../../../src/domain/findings/finding.ts';

/** What a careful person would note, as in the labelled sets beside the project. */
export interface Label {
  readonly cue: number;
  readonly kind: string;
  readonly part?: string;
  readonly what?: string;
  readonly text?: string;
  readonly topic?: string;
  readonly values?: readonly { readonly value: number | string; readonly unit: string }[];
}

export interface LabelledSet {
  readonly cues: readonly Cue[];
  readonly parts: readonly ListedPart[];
  readonly labels: readonly Label[];
}

/**
 * Reads a set of ours: `= number name; alias` a part, `+ kind …` a label of the caption above it, `#` a remark,
 * every other line a caption.
 */
export function readLabelledSet(file: string | URL): LabelledSet {
  const parts: ListedPart[] = [];
  const cues: Cue[] = [];
  const labels: Label[] = [];
  for (const line of readFileSync(file, 'utf8').split('\n')) {
    if (line === '' || line.startsWith('#')) continue;
    if (line.startsWith('= ')) {
      const [, number = '', names = ''] = /^= (\S+) (.*)$/.exec(line) ?? [];
      const [name = '', ...aliases] = names.split(';').map((one) => one.trim());
      parts.push({ number, name, aliases });
    } else if (line.startsWith('+ ')) labels.push(readLabel(line.slice(2), cues.length));
    else cues.push({ start: cues.length * 5000, end: cues.length * 5000 + 4800, lines: [line] });
  }
  return { cues, parts, labels };
}

function readLabel(line: string, cue: number): Label {
  const [kind = '', ...rest] = line.split(' ');
  if (kind === 'part') return { cue, kind, part: rest.join(' ') };
  if (kind === 'caution') return { cue, kind, topic: rest.join(' ') };
  const what = kind === 'setting' ? { what: rest.shift() ?? '' } : {};
  const text = rest.join(' ');
  if (text === '') return { cue, kind };
  if (what.what === 'grit' || (what.what === 'electrode' && text.startsWith('E')))
    return { cue, kind, ...what, text };
  const values = text.split(', ').map((value) => {
    const [, number = '', unit = ''] = /^(.*) (\S+)$/.exec(value) ?? [];
    return { value: unit === 'thread' ? number : Number(number), unit };
  });
  return { cue, kind, ...what, values };
}
