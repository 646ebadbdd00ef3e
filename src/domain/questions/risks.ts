import { findTopics } from '../cautions/find-topics.ts';
import { type CautionTopic } from '../cautions/topics.ts';

/** What makes a question risky: what a wrong answer to it can hurt someone with. */
export const RISKS = [
  'load',
  'pressure',
  'lifting',
  'electrics',
  'guards',
  'fumes',
  'welds',
  'safety',
] as const;
export type Risk = (typeof RISKS)[number];

/** The risks as people read them. */
export const RISK_LABELS: Readonly<Record<Risk, string>> = {
  load: 'load',
  pressure: 'pressure',
  lifting: 'lifting',
  electrics: 'electrics',
  guards: 'guards',
  fumes: 'fumes',
  welds: 'structural welds',
  safety: 'asks what is safe',
};

/** The risk that a caution's topic stands for; other topics hurt whoever asks less than a wrong answer would. */
const OF_TOPIC: Partial<Record<CautionTopic, Risk>> = {
  load: 'load',
  stored: 'load',
  pressure: 'pressure',
  lifting: 'lifting',
  electric: 'electrics',
  rotating: 'guards',
  pinch: 'guards',
  zinc: 'fumes',
  fumes: 'fumes',
  solvents: 'fumes',
  paint: 'fumes',
  arc: 'welds',
};

/** The usual caution that stands beside a question of a risk. */
const CAUTION_OF: Partial<Record<Risk, CautionTopic>> = {
  load: 'load',
  pressure: 'pressure',
  lifting: 'lifting',
  electrics: 'electric',
  guards: 'rotating',
  fumes: 'fumes',
  welds: 'load',
};

/**
 * Words of questions beyond those that cautions look for. Our own list: it may ask once too often, never silently
 * once too few.
 */
const ASKED: Readonly<Record<Risk, RegExp>> = {
  load: /\b(tonn?es?|tons?|kN|how strong|(strong|thick|heavy|stiff|big) enough|(will|does|would|can) (it|they|this|that) (hold|take|carry|bear|bend|break|snap)|hold the (weight|load)|weights?|buckl\w+|collaps\w+|overload\w*|rated (for|to|at)|capacity|factor of safety|shear (pin|strength)|yield strength|grade (5|8|8\.8|10\.9|12\.9) bolts?)\b/i,
  pressure:
    /\b(hydraul\w*|pneumat\w*|burst\w*|leak\w*|NPTF?|BSPP?|BSPT?|ports?|port threads?|pumps?|relief|accumulators?|air (tank|receiver)|kPa)\b|\bG ?\d\/\d/i,
  lifting: /\b(jibs?|gantr\w+|chain (block|fall)s?|fork-?lifts?|overhead|lifting (eye|lug)s?|eye ?bolts?)\b/i,
  electrics:
    /\b(electric\w*|fuses?|fused|(circuit )?breakers?|earth(ed|ing)|ground(ed|ing) (wire|rod|the)|RCDs?|GFCIs?|wires?|cables?|(wall )?sockets?|outlets?|motor (starter|wiring)|capacitors?|inverter|VFD|(1|one|single|3|three)[- ]phase)\b/i,
  guards:
    /\b(guards?|guarded|guarding|interlocks?|two-hand(ed)?|bypass\w*|(emergency|e)[- ]stop|kill switch|fingers?|hands? (in|near|under|clear)|without (the|a) (cover|lid|shield))\b/i,
  fumes: /\b(fumes?|smoke|ventilat\w+|breath(e|ing)|respirators?|cadmium|plated|phosgene)\b/i,
  welds:
    /\b(weld\w*|fillets?|penetration|preheat\w*|root gap|undercut|crack(s|ed|ing)?|E?70(14|18|24)|E?60(10|11|13))\b/i,
  safety:
    /\b(safe|safely|safety|unsafe|danger\w*|hurt|injur\w+|kill(ed|s)?|licen[cs]e\w*|(kids?|child(ren)?))\b/i,
};

/**
 * What in a question makes it risky, in the order of the list: a rule by topic, in its first form. One more look by
 * a person stands beside it: whoever sorts questions can mark one by hand.
 * @param text as it was asked
 * @param topics of the caution that the question is asked about, where it is about one
 */
export function findRisks(text: string, topics: readonly CautionTopic[] = []): Risk[] {
  const ofTopics = new Set([...findTopics(text), ...topics].map((topic) => OF_TOPIC[topic]));
  return RISKS.filter((risk) => ofTopics.has(risk) || ASKED[risk].test(text));
}

/** The topics whose usual cautions stand beside a question with these risks, each once. */
export function cautionsOf(risks: readonly string[]): CautionTopic[] {
  const topics = RISKS.filter((risk) => risks.includes(risk)).map((risk) => CAUTION_OF[risk]);
  return [...new Set(topics)].filter((topic) => topic !== undefined);
}

/** What can always be answered to a risky question. */
export const READY_REFUSAL = "I can't answer for your design; ask a licensed person.";
