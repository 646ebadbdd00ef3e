/** What stands around a number that has no unit, and what it then is. Our own lists, of words that any trade uses. */

/** How far back, in words, a unit still counts as the one being worked in. Our own: about half a minute. */
export const NEAR = 60;
/** Behind one of these stands a value, if anything. */
const AT = String.raw`(?:(?:at|to|is|on|around|about|say|of|with|roughly|like|maybe|only|it's|exactly|nearly|just|over|under|for|a|be|near|says|said|as|runs|be) )`;
const at = (list: string) => new RegExp(`\\b(?:${list})(?:'s)? (?:\\w+(?:'\\w+)? ){0,4}?${AT}+$`);
export const SPEED = at(
  'speed|speeds|spindle|revs|rpm|router|drill press|spin|spinning|running|chuck|variable speed',
);
export const FEED = at('feed|feeds|feedrate|feeding');
export const CURRENT = at('amps|amperage|current|welder|machine');
export const VOLTS = at('volts|voltage');
export const TORQUE = at('torque|torques|torqued|torquing|torque wrench|torque them|torque it');
export const PRESSURE = at('pressure|relief|regulator|psi|compressor|relief valve|unloader');
export const HEAT = at(
  'oven|kiln|preheat|preheated|temper|tempered|tempering|temperature|temp|thermostat|bake|baked|heat gun|quench oil|annealed?',
);
export const NUMBER_WORD =
  /^(?:\d.*|one|two|three|four|five|six|seven|eight|nine|ten|eleven|twelve|.*teen|twenty|thirty|forty|fifty|sixty|seventy|eighty|ninety)$/;
/** Electrodes as they are sold, in millimetres: ISO 544. */
export const ROD_MM = [1.6, 2, 2.5, 2.6, 3.2, 4, 5];
/** Somebody changes what is set: "down to sixty". */
export const TURNED =
  /\b(?:(?:down|up|back|drop(?:ped|ping)?(?: it| that| her)?|bump(?:ed)?(?: it| that)?|turn(?:ed)?(?: it| that| her)?|knock(?:ed)?(?: it| that)?|crank(?:ed)?(?: it| that)?|wound(?: it)?|backed(?: it)?)(?: back| up| down| off)? (?:to|at)|(?:try|tried|call it|make it|went with|going with|go with)) (?:about |around |maybe |a |like |more like )?$/;
const MADE = String.raw`cut|cutting|trim|trimmed|sawn|sawed|ripped|ripping|plane|planed|turn|turned|turning|bore|bored|boring|mill|milled|milling|drill|drilled|drilling|reamed?|machined?|faced?|ground|filed|sanded|finished?|chopped|docked|shortened|stretched|rolled|bent|made|making|opened|opened up|brought|taken|take|took|spaced|skimmed|scribed|marked|mark|measured?|measures|measuring|reads?|reading|comes?|came|ends?|ended|finishes|works out|laid out|set out|cropped|hacked|sheared|squared|pitched|folded|routed|notched|dressed|thicknessed|jointed|resawn|drawn|forged|upset|poured|screeded|dug|stuck out|hangs|sits|sticking out|punched|knocked out|cored|holes?|slots?|bolt circle|pcd|centers|centres`;
export const SIZED = new RegExp(
  `\\b(?:${MADE})(?: (?:it|them|that|those|these|this|everything|all|both|one|in|out|up|down|back|off|over|the \\w+|my \\w+)){0,3} (?:at|to|down to|out to|up to|in at|out at|up at|be|as|about|from|on)(?: (?:about|around|exactly|like|just|a|roughly|nearly|over|under|more like))* $`,
);
export const READ =
  /\b(?:measures?|measured|measuring|reads?|reading|come out|comes out|works out|should be|supposed to be|meant to be|needs to be|wants to be|has to be|ought to be)(?: (?:at|about|exactly|like|just|more like|closer to))* $/;
export const PLANNED =
  /\b(?:drawing|drawings|plan|plans|print|prints|sheet|spec|list|book|sketch|cad|model|instructions?)(?:'s)? (?:(?:says?|said|calls? for|shows?|wants?|wanted|asks? for|asked for|has|had|got|gives?|reads|called for|it at|them at|it as|it|them|only|clearly) )+(?:about |a |at |as )*$/;
export const DIAMETER =
  /\b(?:wall|bore|rise|run|drop|span|sweep|projection|stroke|throw|reach|diameter|thickness|width|height|depth|length|radius|pitch|spacing|offset|gap|od|id|throat|leg|overhang|reveal|kerf|centers|centres)(?:'s| is| was| of| at| should be| comes out at| came out at)(?: (?:about|a|at|only|just))* $/;
export const DEGREES = new Set([15, 22.5, 30, 45, 60, 90]);
export const ANGLED =
  /\b(?:cut|cuts|miter|mitre|mitered|mitred|bevel|beveled|bevelled|chamfer|chamfered|angle|angled|angles|fold|folded|bend|bent|tilt|tilted|saw|blade|lean|leaning|slope|taper|corners?|ends?|edges?|brace|countersink|ground)\b/;
/** Lumber by its nominal size in inches: ASTM/ALSC PS 20 sections that yards keep. */
export const NOMINAL = new Set(
  '1x2 1x3 1x4 1x6 1x8 1x10 1x12 2x2 2x3 2x4 2x6 2x8 2x10 2x12 4x4 4x6 6x6 3x2 4x2 6x2 8x2 6x1 4x1 3x3 4x3 6x4 8x4 8x8 2x1 3x1 5x4 5x5 4x8 3x4 3x6'.split(
    ' ',
  ),
);
export const COUNTED_TURNS =
  /^(?:turn|turns|of the (?:way|time|people|batch)|way|way through|full|the|of my|of you|of us|of them|of it|an hour|a mile|a minute|a second|past|price|day|mile|dozen|million|decent|done|finished|moon|pipe|cup|asleep|dead|expect\w*|thought|hoping|a day|a dozen|a chance)\b/;
