import { CAUTION_TOPICS, type CautionTopic } from './topics.ts';

/** Words of running text that touch a topic. Our own list: it may ask once too often, never silently once too few. */
const TOUCHES: Readonly<Record<CautionTopic, RegExp>> = {
  zinc: /\b(zinc|galvani[sz]\w*|galv)\b/i,
  fumes: /\b(fumes?|smoke from|braz\w+|soldering flux)\b/i,
  arc: /\b(weld\w*|arc|E?(6010|6011|6013|7014|7018|7024)|electrodes?|tack(ed|s|ing)?)\b/i,
  rotating:
    /\b(lathe|drum (turns|spins|runs)|under power|belts?|pulleys?|sprockets?|rpm|flywheel|mill(ing)? (machine|drum)|rotat\w+|spinning|drill press)\b/i,
  grinding: /\b(grind(s|er|ing)?|ground back|flap disc|cut-?off (disc|wheel)|abrasive)\b/i,
  pressure: /\b(hydraulics?|pressure|psi|MPa|relief valve|cylinders?|rams?|hoses?)\b|\b\d+\s?bar\b/i,
  lifting: /\b(lift(s|ed|ing)?|hoists?|cranes?|slings?|shackles?)\b/i,
  load: /\b(under load|overload\w*|load test\w*|jacks?|jacked)\b/i,
  stored:
    /\b(capacitors?|accumulators?|compressed spring|spring (tension|loaded)|stored energy|counterweights?)\b/i,
  pinch: /\b(pinch\w*|crush(ed|ing)? (hand|finger)s?|fingers? (out|clear))\b/i,
  fire: /\b(torch|flames?|sparks?|oxy-?(fuel|acetylene)|plasma cut\w*|cutting torch|fire)\b/i,
  electric:
    /\b(mains|wiring|wired|live wire|volts?|starter box|contactor|three-phase|single-phase)\b|\b\d+\s?V\b/,
  dust: /\b(dust|sanding|asbestos|silica)\b/i,
  paint: /\b(old paint|lead paint|leaded paint|strip(ped|ping)? the paint|flaking paint)\b/i,
  eyes: /\b(chips (fly|flying)|wire (brush|wheel)\w*|safety glasses|swarf)\b/i,
  hearing: /\b(ear (muffs|plugs|protection)|deafening|loud)\b/i,
  chemicals: /\b(acids?|caustic|lye|pickling|bluing salts|epoxy|isocyanate\w*)\b/i,
  solvents: /\b(brake cleaner|parts cleaner|degreas\w+|acetone|thinners?|solvents?)\b/i,
  food: /\b(food[- ](safe|grade|contact)|juice|cider|apple pulp)\b/i,
};

/** The topics that a text touches, in the order of the list. */
export function findTopics(text: string): CautionTopic[] {
  return CAUTION_TOPICS.filter((topic) => TOUCHES[topic].test(text));
}
