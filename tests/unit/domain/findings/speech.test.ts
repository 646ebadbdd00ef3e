import { describe, expect, it } from 'vitest';
import { type Cue } from '../../../../src/domain/captions/cue.ts';
import { readCaptionsText } from '../../../../src/domain/captions/read-captions.ts';
import { readFindings } from '../../../../src/domain/findings/read-findings.ts';
import { readSpeech } from '../../../../src/domain/findings/speech/read-speech.ts';

const cue = (start: number, ...lines: string[]): Cue => ({ start, end: start + 2000, lines });
const words = (...cues: Cue[]) => readSpeech(cues).texts.join(' ');

describe('Captions as speech', () => {
  it('leave out sounds, notes and fillers', () => {
    expect(words(cue(0, '[music] right um', '♪ the uh drum'))).toBe('right the drum');
  });

  it('spell what is written close together', () => {
    expect(words(cue(0, 'a 40x40x3 box, 10mm off, 3/4" ply at 45° and a forty-five'))).toBe(
      'a 40 by 40 by 3 box 10 mm off 3/4 inch ply at 45 degrees and a forty five',
    );
  });

  it('keep a plain repeat of a line', () => {
    expect(words(cue(0, 'yes'), cue(2000, 'yes'), cue(4000, 'right'))).toBe('yes yes right');
  });

  it('are in the order in which they are spoken, whatever the order of the file', () => {
    expect(words(cue(4000, 'drum'), cue(0, 'the'))).toBe('the drum');
  });
});

/** As video hosts give captions out: each line first with its word times, then still, then above the next. */
const ROLLING = `WEBVTT

00:00:01.000 --> 00:00:03.000
 
so<00:00:01.400><c> the</c><00:00:01.800><c> hopper</c><00:00:02.200><c> is</c>

00:00:03.000 --> 00:00:03.010
so the hopper is
 

00:00:03.010 --> 00:00:05.000
so the hopper is
two<00:00:03.400><c> mil</c><00:00:03.800><c> sheet</c>

00:00:05.000 --> 00:00:05.010
two mil sheet
 

00:00:05.010 --> 00:00:07.000
two mil sheet
and<00:00:05.400><c> the</c><00:00:05.800><c> spout</c><00:00:06.200><c> too</c>

00:00:07.000 --> 00:00:07.010
and the spout too
 
`;

describe('Rolling captions', () => {
  const read = readCaptionsText(ROLLING);
  const cues = read.ok ? read.value.cues : [];

  it('are unrolled: each line is read once, where it comes first', () => {
    expect(readSpeech(cues).texts.join(' ')).toBe('so the hopper is two mil sheet and the spout too');
  });

  it('give a finding the times of its own words', () => {
    const parts = [
      { number: '111', name: 'hopper', aliases: [] },
      { number: '132', name: 'spout', aliases: [] },
    ];
    const found = readFindings(cues, parts);
    const rounded = (seconds: number) => Math.round(seconds * 10) / 10;
    expect(
      found.map(({ kind, span }) => [kind, span.from.cue, span.words, ...span.seconds.map(rounded)]),
    ).toEqual([
      ['part', 1, 'hopper', 1.8, 2.1],
      ['size', 3, 'two mil', 3, 3.7],
      ['part', 5, 'spout', 5.8, 6.1],
    ]);
  });
});
