import { type HeardTopic } from '../finding.ts';
import { phrase, type Speech, wordOfOffset } from '../speech/speech.ts';
import { GRINDS, GUARD_OFF, type Hazard, HAZARDS, WARNS } from './hazards.ts';
import { type Remark } from './remark.ts';

/** Something that can hurt, as it is done or warned of. */
export interface Caution extends Remark {
  readonly kind: 'caution';
  readonly topic: HeardTopic;
}

/** How sure a caution is that says of itself what can hurt. */
const OUTRIGHT = 0.85;
/** How far from a hazard's word a warning stands, in words. Our own: one caption or two. */
const BEFORE = 9;
const BEHIND = 13;
/** Words within which one topic is one hazard still. */
const SAME = 60;
/** Topics that one sentence touches together are one hazard: the first of these stands for the others. */
const INSTEAD: Readonly<Partial<Record<HeardTopic, readonly HeardTopic[]>>> = {
  fumes: ['zinc', 'dust', 'chemicals', 'fire'],
  chemicals: ['fumes'],
  lifting: ['load'],
  load: ['lifting', 'pressure'],
  rotating: ['grinding'],
  eyes: ['chemicals'],
  fire: ['grinding', 'chemicals'],
  pinch: ['rotating', 'pressure', 'lifting', 'load', 'grinding'],
  dust: ['fumes'],
};
const SAME_SENTENCE = 14;
/** Cautions that may stand within such a distance, at most. */
const NEIGHBOURS = 16;
/** Galvanised smoke is told at length. */
const SMOKE = 45;

/** The cautions of the captions in order, one a hazard, at its first word. */
export function findCautions(speech: Speech): Caution[] {
  const found = [...HAZARDS.flatMap((hazard) => findHazard(speech, hazard)), ...findGuards(speech)].sort(
    (a, b) => a.from - b.from || b.sure - a.sure,
  );
  const told = found.filter(
    (caution, index) => !isTold(caution, found.slice(Math.max(0, index - NEIGHBOURS), index + NEIGHBOURS)),
  );
  const kept: Caution[] = [];
  const last = new Map<HeardTopic, Caution>();
  for (const caution of told) {
    const same = last.get(caution.topic);
    if (same === undefined || caution.from - same.to > SAME) kept.push(caution);
    last.set(caution.topic, caution);
  }
  return kept;
}

function isTold(caution: Caution, all: readonly Caution[]): boolean {
  // A warning belongs to what is named outright beside it.
  if (
    caution.sure < OUTRIGHT &&
    all.some(
      (other) =>
        other.sure >= OUTRIGHT &&
        other.topic !== caution.topic &&
        !(INSTEAD[other.topic] ?? []).includes(caution.topic) &&
        other.from - caution.from <= BEHIND &&
        caution.from - other.to <= BEFORE,
    )
  )
    return true;
  const others = INSTEAD[caution.topic] ?? [];
  return all.some(
    (other) =>
      other !== caution &&
      others.includes(other.topic) &&
      Math.abs(other.from - caution.from) <= (other.topic === 'zinc' ? SMOKE : SAME_SENTENCE) &&
      // Where each would stand for the other, the surer does, then the first.
      (!(INSTEAD[other.topic] ?? []).includes(caution.topic) ||
        other.sure > caution.sure ||
        (other.sure === caution.sure && other.from <= caution.from)),
  );
}

function findHazard(speech: Speech, { topic, plain, touched, unless, reach = BEHIND }: Hazard): Caution[] {
  const make = (match: RegExpMatchArray, rule: string, sure: number): Caution[] => {
    const from = wordOfOffset(speech, match.index ?? 0);
    const to = wordOfOffset(speech, (match.index ?? 0) + match[0].length - 1) + 1;
    const sense = topic === 'dust' && match[0].includes('dust') ? undefined : unless;
    if (sense?.test(phrase(speech, from - 10, to + 10)) === true) return [];
    return [{ kind: 'caution', topic, from, to, rule, sure }];
  };
  const plainly =
    plain === undefined
      ? []
      : [...speech.text.matchAll(plain)].flatMap((match) => make(match, `${topic}: said outright`, OUTRIGHT));
  const warned =
    touched === undefined
      ? []
      : [...speech.text.matchAll(touched)].flatMap((match) => {
          const from = wordOfOffset(speech, match.index);
          return WARNS.test(phrase(speech, from - BEFORE, from + reach))
            ? make(match, `${topic}: with a warning`, 0.6)
            : [];
        });
  return [...plainly, ...warned];
}

function findGuards(speech: Speech): Caution[] {
  return [...speech.text.matchAll(GUARD_OFF)].map((match) => {
    const from = wordOfOffset(speech, match.index);
    const to = wordOfOffset(speech, match.index + match[0].length - 1) + 1;
    const topic = GRINDS.test(phrase(speech, from - 10, to + 8)) ? 'grinding' : 'rotating';
    return { kind: 'caution', topic, from, to, rule: `${topic}: guard off`, sure: 0.85 };
  });
}
