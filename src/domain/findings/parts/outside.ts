import { after, before, type Speech, wordAt } from '../speech/speech.ts';
import { type ListedName } from './listed-names.ts';
import { isPlural, stem } from './stem.ts';

const set = (list: string): ReadonlySet<string> => new Set(list.trim().split(/\s+/));

/** Words before a part's word that make something else of it: an oil drum, the kitchen table, a steering wheel. */
const OTHERS_BEFORE = set(`
  kitchen dinner dining coffee garden car truck bike bicycle motorbike tractor trailer washing brake steering garage office tyre tire grinder
  grinding vacuum petrol diesel beer football school church neighbor neighbour neighbors neighbours cot picnic pool snooker periodic water
  emergency spare ferris cheese potter's potters wagon cart dinghy ship's airplane movie film picture photo mirror
  boot shoe wine cook pencil chicken turkey hacksaw bus fridge oven dishwasher dryer coat number license licence ear snare bass
  swimming stomach breast rock tree store bicycle's mower lawnmower wheelie chop miter mitre cold
  computer mouse sewing telephone lamp
`);
/** Pairs of words that are a thing of their own though each word may be the build's. */
const COMPOUNDS = set(
  'oil_drum fire_door gas_tank soft_top shop_floor hot_rod bench_top table_leg kitchen_top water_wheel big_wheel shop_door roof_beam fire_hose garden_hose',
);
/** Words behind a part's word that make a tool or another thing of it: drum kit, belt sander, spring steel. */
const OTHERS_BEHIND = set(`
  saw saws sander sanders grinder grinders wrench wrenches spanner spanners cutter cutters kit brake brakes cleaner cleaning store yard guy company barrow
  driver drivers puller pullers press? car cars truck oil grease music player machine gun welder tape section? steel? loader house lamp chair
`);
const BODY = set(
  'arm leg foot head hand finger back rib jaw neck shoulder knee elbow nose tongue chin heel toe eye ear face palm skin thumb body chest hip',
);
/** Words for where something is, which may be parts too: the top of the stairs, the other side. */
const PLACES = set('top side back bottom front end base middle inside edge face corner center');
const ABOUT = set(
  'on at other one each either every same wrong both far near by left right from off over to this that in out any',
);
const ASKED =
  /\b(?:what's|what is|how's|how is|how do you|does|is|are|show me|tell me|what are|how are|and) your $/;
/** Somebody else's thing and what it has. */
const THEIRS =
  /\b(?:neighbou?r|neighbou?rs|mate|friend|buddy|dad|mum|mom|brother|sister|uncle|cousin|grandad|grandpa|grandfather|father|guy|fella|bloke|kid|wife|husband|someone|somebody|everyone)'s? (?:\w+ )?(?:has|had|have|is|was|with|got)(?: got)? (?:a|an|the|no|his|her|two|three) (?:\w+ )?$/;
const SOMEBODYS = set("my your his her their our someone's somebody's everyone's");
const SUBJECTS = set(
  "i you we they to can could will would should must won't can't don't didn't couldn't wouldn't shouldn't gonna wanna i'll you'll we'll they'll let's it'll that'll please cannot never",
);
const SINGULAR_SUBJECTS = set('it he she who everything something nobody that which');
const PUT = set('it them him me us itself');
const OBJECTS = set('it them him this that those these the my your me us');
const CONTRACTED = set(
  "it's that's here's there's what's let's he's she's who's where's how's everyone's one's this's today's nobody's everything's something's when's",
);

/** Whether the words of a name are something else here: a verb, somebody's leg, the neighbour's wheel. */
export function isOutside(speech: Speech, name: ListedName, from: number, to: number): boolean {
  const last = wordAt(speech, from - 1);
  const next = speech.words[to - 1]?.stop === '' ? wordAt(speech, to) : '';
  const previous = speech.words[from - 1]?.stop === '' ? last : '';
  const whole = wordAt(speech, from);
  // "My grandfather's drum", but not "that's drum".
  if (/'s$/.test(previous) && !CONTRACTED.has(previous) && isSomebody(previous)) return true;
  if (THEIRS.test(`${before(speech, from, 6)} `)) return true;
  if (name.stems.length > 1) return false;
  if (OTHERS_BEHIND.has(next)) return true;
  if (PLACES.has(name.stems[0] ?? '') && (next === 'of' || ABOUT.has(previous))) return true;
  if (previous === 'your' && ASKED.test(`${before(speech, from, 4)} `)) return true;
  if (OTHERS_BEFORE.has(previous) || COMPOUNDS.has(`${previous}_${stem(whole)}`)) return true;
  if (
    BODY.has(name.stems[0] ?? '') &&
    (SOMEBODYS.has(previous) ||
      /\b(?:lose|losing|lost|break|broke|pull|pulling|cost|costs) (?:an?|your|my|the) $/.test(
        `${before(speech, from, 3)} `,
      ))
  )
    return true;
  // The caption before may have ended on anything.
  const beside = speech.words[from - 1]?.cue === speech.words[from]?.cue ? previous : '';
  return isVerb(speech, beside, next, isPlural(whole), from, to);
}

function isSomebody(word: string): boolean {
  return !/^(?:machine|part|today|build|drawing|plan|side|end)'s$/.test(word);
}

function isVerb(
  speech: Speech,
  previous: string,
  next: string,
  plural: boolean,
  from: number,
  to: number,
): boolean {
  // "Stand it upright" is no upright.
  if (!plural && (SUBJECTS.has(previous) || PUT.has(previous))) return true;
  if (plural && SINGULAR_SUBJECTS.has(previous)) return true;
  if (
    !plural &&
    OBJECTS.has(next) &&
    !/'s$/.test(wordAt(speech, to - 1)) &&
    (previous === '' || previous === 'and' || previous === 'then' || previous === 'just' || previous === 'so')
  )
    return true;
  // "Six foot two", "on foot", "bear in mind", "in the long run".
  const b = `${before(speech, from, 3)} `;
  const a = after(speech, to, 3);
  return /\b(?:\d+|six|five|four|three|two|square|cubic|on) $/.test(b) && wordAt(speech, from) === 'foot'
    ? true
    : /^in mind\b/.test(a);
}
