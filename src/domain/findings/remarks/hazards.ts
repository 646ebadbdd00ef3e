import { type HeardTopic } from '../finding.ts';

/** How a hazard shows in speech. Our own lists; the topics are those of domain/cautions. */
export interface Hazard {
  readonly topic: HeardTopic;
  /** Says of itself that something can hurt, or that it is guarded against. */
  readonly plain?: RegExp;
  /** Touches the topic: a caution only where somebody is warned, or admits, close by. */
  readonly touched?: RegExp;
  /** Words within which a warning counts, where they are more than a caption or two. */
  readonly reach?: number;
  /** Another topic's words that make it something else. */
  readonly unless?: RegExp;
}

const pattern = (text: string) => new RegExp(`(?<= |^)(?:${text})(?= |$)`, 'g');
const ON = String.raw`(?:\S+ ){0,3}?(?:on|in|down|up|back on|at the ready|please)`;
const OFF = String.raw`(?:guard|guards|shield|cover|guarding)(?:'s| is| was| are)? (?:\S+ ){0,2}?(?:off|missing|removed|gone|up|not on|out of the way|on the shelf|in the bin|in a drawer|in the drawer)|(?:took|taken|take|taking|pulled|without|no|with no|removed?|left|lost) (?:\S+ ){0,2}?(?:the |a |my |its |that )?guards?(?: off)?`;

/** Hazards, the more particular first: what is read as one is not read as a later one of the same words. */
export const HAZARDS: readonly Hazard[] = [
  {
    topic: 'zinc',
    plain: pattern(
      String.raw`(?:metal|metal fume|zinc|galv|fume) (?:fume )?(?:fever|shakes|shivers|flu|chills|poisoning)|zinc fumes?|(?:galv|galvani[sz]ed|gal|zinc) (?:\S+ ){0,9}?(?:fumes?|smoke|breath\w*)`,
    ),
    reach: 34,
    touched: pattern(
      String.raw`zinc|galvani[sz]ed|galvani[sz]ing|galv|gal|galvo|zinc plated|zinc coating|passivated`,
    ),
  },
  {
    topic: 'grinding',
    plain: pattern(
      String.raw`(?:disc|disk|discs|wheel|wheels|cut off wheel|cutoff wheel|cutting disc) (?:\S+ ){0,3}?(?:explode[sd]?|exploding|shatter\w*|burst\w*|let go|lets go|come apart|comes apart|flew apart|fly apart|grenade\w*|crack(?:ed|s)?|grab\w*|bind\w*|jam\w*|bite[sd]?|kick\w*)|grinder (?:\S+ ){0,4}?(?:kick\w*|grab\w*|bite\w*|bit me|jump\w*|climb\w*|skate\w*|snatch\w*|catch|catches|caught)|ring test|never (?:\S+ ){0,3}?side of (?:a|the) (?:wheel|disc)|(?:out of|in) line with the (?:disc|wheel)|(?:two|both) hands on (?:the|a|that) grinder`,
    ),
    touched: pattern(
      String.raw`grinder|grinders|grinding|angle grinder|cut off wheel|cutoff wheel|cutting disc|slitting disc|zip disc|flap disc|grinding wheel|bench grinder`,
    ),
  },
  {
    topic: 'rotating',
    plain: pattern(
      String.raw`sleeves? (?:\S+ ){0,2}?(?:up|rolled|back|off|tight|tucked|caught|in the)|(?:hair|ponytail|beard) (?:\S+ ){0,2}?(?:tied|back|up|tucked|caught|away|in a bun|net)|(?:tie|tied|tuck|tucked) (?:\S+ ){0,2}?(?:hair|beard|hoodie|drawstrings?)|(?:no|never|don't wear|without|take|took|taking|lose|gloves|rings?|watch|necklace|jewel\w+|tie|scarf|lanyard|hoodie|loose clothing|loose clothes|baggy \S+|drawstrings?) (?:\S+ ){0,3}?(?:gloves|loose|rings?|jewel\w+|hoodie|scarf|lanyard|off|near|around) (?:\S+ ){0,5}?(?:lathe|drill|drill press|mill|spindle|chuck|spinning|machine|router|saw|rotating|shaft|pto|anything that)|chuck key|(?:blade|chuck|cutter|disc|wheel|spindle|drum|fan|rotor|shaft|flywheel|impeller|bit|head|it|belt) (?:\S+ ){0,3}?(?:coast\w*|still (?:spinning|turning|going|moving|running)|keeps? (?:on )?(?:spinning|turning|going|coasting)|stops? (?:spinning|turning|dead)|stopped (?:spinning|turning)|spin(?:s|ning)? down|winds? down)|kick ?backs?|push ?sticks?|push ?blocks?|(?:wrap|wraps|wrapped|wind|winds|pull|pulls|pulled|drag|drags|suck|sucks|reel|reels) (?:you|your|me|him|her|it|himself|them|a glove|the glove|my \S+) (?:\S+ ){0,3}?(?:in|into|round|around|up)|(?:grab|grabs|grabbed|snatch\w*|catch\w*|caught) (?:\S+ ){0,3}?(?:sleeve|glove|gloves|hair|hoodie|cuff|finger|workpiece|hand|jacket|coat)|pto|belt (?:guard )?(?:\S+ ){0,2}?(?:have your|take your|eat)|(?:argument|argue|arguing|fight) with a (?:lathe|mill|saw|drill|machine)`,
    ),
    touched: pattern(
      String.raw`lathe|chuck|spinning|spins|rotating|drill press|pillar drill|spindle|flywheel|table saw|bandsaw|band saw|router|blade|pulley|pulleys|belt drive|v belt|chain drive|sprocket|sprockets|auger|shredder|fan|propeller|power feed|milling machine|miter saw|chop saw|circular saw|planer|jointer|shaper|under power`,
    ),
    unless: /\b(?:grinder|disc|flap)\b/,
  },
  {
    topic: 'pressure',
    plain: pattern(
      String.raw`(?:feel\w*|check\w*|look\w*|hand|finger|fingers|touch\w*|search\w*|poke|point) (?:\S+ ){0,4}?(?:for (?:a |the )?leaks?|over (?:a|the) leak|leak)|(?:leak|pinhole|jet|stream|oil|fluid|spray) (?:\S+ ){0,6}?(?:through|into|under|in) (?:your |the |a |like )?(?:skin|hand|finger|arm|glove|you)|(?:fluid|oil|high pressure) injection|inject\w* (?:\S+ ){0,3}?(?:skin|hand|you|finger)|(?:let|bleed|bled|dump|drop|release|relieve|vent|take|knock|crack) (?:\S+ ){0,3}?pressure (?:off|out|down|first|before)?|(?:residual|trapped|stored|still under|hidden|locked in) pressure|pressure (?:\S+ ){0,4}?(?:before you|off before|still in)|(?:hose|line|fitting|pipe|tank|bottle|tyre|tire|gauge|plug|cap) (?:\S+ ){0,3}?(?:let go|lets go|letting go|burst\w*|blow\w* (?:off|up|out)|blew|whip\w*|explode\w*|fail\w*|pop\w* off|flies off|flew off)|(?:never|don't|do not|not) (?:\S+ ){0,6}?(?:under|with) pressure|whip check|test\w* (?:\S+ ){0,8}?never (?:with )?air|(?:chain|tie|strap) the (?:gas )?(?:bottle|cylinder)|(?:air ?line|compressed air|blow ?gun|air hose|air gun) (?:\S+ ){0,6}?(?:skin|yourself|face|eyes?|ear|someone|anyone|people|each other|kids)|bomb`,
    ),
    touched: pattern(
      String.raw`pressure|pressuri[sz]ed|hydraulic|hydraulics|compressed air|accumulator|hose|hoses|leak|leaks|relief valve|air tank|boiler|gas bottle|cylinder of`,
    ),
  },
  {
    topic: 'load',
    plain: pattern(
      String.raw`(?:rope|chain|cable|strap|sling|wire|winch|line|ratchet|tow|come along|spring|strop) (?:\S+ ){0,6}?(?:under (?:load|tension|strain)|snap\w*|let go|lets go|part\w*|break\w*|breaks|recoil\w*|whip\w*|takes? your)|under (?:load|tension|a load|strain) (?:\S+ ){0,6}?(?:stand|stay|keep|never|don't|clear|snap|kill|back|watch)|(?:stand|stood|standing|step|straddl\w+|astride) (?:\S+ ){0,4}?(?:over|across|in line with|in front of|behind|bight) (?:\S+ ){0,4}?(?:rope|chain|cable|strap|winch|line|bight|load|spring)|(?:never|don't|do not|not|shouldn't|wouldn't) (?:\S+ ){0,8}?(?:trust|rely on|on just) (?:\S+ ){0,4}?(?:jack|jacks|jackstand|jack stand|blocks|props?|stack of)|(?:axle|jack) stands?|(?:jack|prop|props|stand|stands|shore|shoring|blocks?|scaffold|ladder|bench|shelf|trestle|trestles) (?:\S+ ){0,4}?(?:slip\w*|kick\w* out|collaps\w*|let go|lets go|topple\w*|tip\w* over|fall\w* over|give way|gave way|buckle\w*)|(?:overload\w*|safe working load|over (?:its|the) rating)|(?:spring|springs|garage door spring|coil) (?:\S+ ){0,5}?(?:compressed|fly|flies|flew|take your|under tension|let go)|tip\w* over on|stored energy|(?:take|takes|took|have|rip|rips) (?:your|his|my) (?:head|teeth|face|jaw|kneecaps?|chin)|catapult`,
    ),
    touched: pattern(
      String.raw`under load|under tension|jacks?|jacked up|jackstands?|winch|props?|propped|tensioned|load test|spring loaded|ratchet strap|spring tension|preload`,
    ),
  },
  {
    topic: 'lifting',
    plain: pattern(
      String.raw`(?:never|don't|do not|not|nobody|no one|shouldn't) (?:ever |even )?(?:get|go|be|stand|walk|crawl|put|stick|reach|work|lie|stay|have) (?:\S+ ){0,3}?(?:under|underneath|beneath|below) (?:it|a|the|that|any|anything|something|this|one|there|suspended|here)|(?:walk|stand|stood|standing|get|crawl|reach|work|working|be|lie|lying|stick) (?:\S+ ){0,3}?(?:under|underneath|beneath) (?:a|it|the|that|this|anything|something|suspended|one) (?:\S+ ){0,4}?(?:load|hoist|crane|lift\w*|hanging|hung|chain|jack|forks|suspended|up there|in the air)|(?:nobody|no one|don't|never) (?:ever )?(?:goes?|gets?|stands?|walks?|stays?) (?:\S+ )?(?:underneath|under)|suspended load|overhead load|(?:lift|lifting|lifted|pick|picking|carry|carrying|move|moving) (?:\S+ ){0,6}?(?:with your legs|with your knees|bend your knees|your back|my back|by yourself|on your own|on my own|by myself|alone|two people|two person|two man|second pair of hands|a mate|a friend|a hand|help)|(?:with|use|bend|from) (?:your|the|my) (?:legs|knees) (?:\S+ ){0,2}?(?:not|your back)?|(?:done|did|do|hurt|put|threw|throw|wreck\w*|twinge\w*|pulled|mind|watch|save|think of) (?:\S+ ){0,2}?(?:my|your) back|two (?:man|person|people) (?:lift|job)|team lift|hernia|slipped disc|engine (?:hoist|crane) (?:\S+ ){0,6}?(?:not|never|don't|clear|out)|toes? (?:\S+ ){0,3}?(?:out|clear|away|if it drops|off)|steel toe\w*|(?:drop|drops|dropped) (?:it |that |this )?on (?:your|my) (?:foot|toe|toes|feet)|stay (?:\S+ )?out from under|out from under(?:neath)?`,
    ),
    touched: pattern(
      String.raw`hoist|crane|gantry|chain block|block and tackle|slings?|shackles?|lifting|lift this|lift that|lift it|lift them|lifted|suspended|swinging|forklift|very heavy|really heavy|properly heavy|heavy enough`,
    ),
  },
  {
    topic: 'electric',
    plain: pattern(
      String.raw`(?:licensed|licenced|qualified|registered|proper|certified|real|actual|competent|a|an|my|the) (?:electrician|sparky|sparkie)|(?:get|call|hire|ask|pay|leave it to|job for|let|find|had) (?:\S+ ){0,3}?(?:electrician|sparky|sparkie)|(?:unplug|unplugged|isolate|isolated|disconnect(?:ed)? the (?:power|mains|battery|supply)|lock(?:ed)? (?:it )?out|lockout|tag out|(?:kill|cut|turn off|switch off|pull) (?:the )?(?:power|breaker|mains|plug|isolator|main)|(?:pull|pop|take|remove|pulled|popped) (?:the|that|your) (?:main )?fuse|(?:disconnect\w*|unhook\w*|take off|took off|off) the (?:battery|negative)|(?:wrench|spanner|ring) across|breaker off|power off|switched off at the wall|off at the wall)|(?:electric(?:al)?|mains) shock|electrocut\w*|shocked (?:me|him|her|myself)|(?:got|get|getting|had|gave|gives|give) (?:\S+ ){0,4}?(?:a shock|zapped|a belt off|a belt from|bitten by the|a jolt)|capacitors? (?:\S+ ){0,8}?(?:charge\w*|kill\w*|bite\w*|hold\w*|discharg\w*|shock|short)|(?:discharge|short) (?:\S+ ){0,3}?(?:capacitors?|caps)|(?:live|hot) (?:wires?|terminals?|conductors?|busbar|end|parts?|side|leg)|(?:is|it's|that's|still|gone|was|went) live|not (?:an electrician|a sparky)|(?:rcd|gfci|gfi|residual current|ground fault)|(?:earth|earthed|earthing) (?:\S+ )?(?:the|your|everything|it|this|that)|(?:ground|grounded|bond) (?:the (?:frame|chassis|case|metal|box|enclosure|machine|motor)|everything)|(?:be|goes|go|become|becomes|end up) live|microwave transformers?`,
    ),
    touched: pattern(
      String.raw`mains|wiring|wired|electrics|electrical|electricity|volts|voltage|two twenty|two forty|one ten|four hundred|three phase|three-phase|single phase|contactor|consumer unit|breaker panel|switch box|junction box|terminals|plugged in|extension lead|capacitor|capacitors|battery bank|lithium|inverter`,
    ),
  },
  {
    topic: 'dust',
    plain: pattern(
      String.raw`(?:dust )?mask (?:\S+ ){0,2}?on|(?:wear|wearing|put|grab|use|get|with) (?:\S+ ){0,3}?(?:dust mask|mask|respirator|p2|p3|n95|ffp\d)|dust mask|(?:cough\w*|breath\w*|inhal\w*|sneez\w*|blow\w* my nose|spit\w*|lungs?|sinus\w*|nose) (?:\S+ ){0,6}?(?:sawdust|dust|silica|filings|fibers?|fibres?|powder)|(?:sawdust|dust|silica|fibers|fibres|fibreglass|fiberglass|carbon) (?:\S+ ){0,6}?(?:lungs?|breath\w*|cough\w*|cancer|mask|carcinogen\w*|toxic|nasty|irritat\w*|chest|itch\w*|bad for you|explo\w*)|asbestos|silicosis|silica|carcinogen\w*|walnut dust|mdf dust|(?:dust )?extract(?:ion|or) (?:\S+ ){0,2}?on|shop ?vac (?:\S+ ){0,2}?on|wet (?:it|the concrete|cut) (?:\S+ ){0,4}?dust|without (?:a|my|the) mask|no mask|respirator`,
    ),
    touched: pattern(
      String.raw`dust|sawdust|fibreglass|fiberglass|carbon fiber|carbon fibre|cement|mdf|silica|concrete dust|sanding|lead paint|old paint|plaster|drywall|powder|respirator`,
    ),
    unless:
      /\b(?:epoxy|resin|fumes?|vapou?rs?|spray\w*|solvents?|paint fumes|isocyanates?|weld\w* (?:fume|smoke)|dust (?:chute|shoot|port|collector|hood)|hardener|acetone|two pack)\b/,
  },
  {
    topic: 'fumes',
    plain: pattern(
      String.raw`(?:fumes?|vapou?rs?|smoke) (?:\S+ ){0,6}?(?:bad|toxic|nasty|poison\w*|kill\w*|lungs?|breath\w*|headache|outside|dizzy|door|doors|window|windows|fan|mask|respirator|sick|build up|heavier|away|horrible|awful|extract\w*|ventilat\w*|no joke)|(?:don't|do not|never|not|stop|without|avoid|shouldn't|to|be|been|was|no) (?:\S+ ){0,3}?breath(?:e|ing) (?:\S+ ){0,3}?(?:that|this|it|any|in|fumes?|smoke|vapou?rs?|stuff|the)|ventilat\w*|fresh air|well ventilated|(?:doors?|windows?|roller door|garage door) (?:\S+ ){0,2}?open|open (?:the|a|your|all the|every|both) (?:\S+ )?(?:doors?|windows?)|(?:fan|extractor|extraction|fume hood)(?:'s| is)? (?:\S+ )?on|carbon monoxide|phosgene|cadmium|beryllium|hex(?:avalent)? chrom\w*|out of the (?:fumes?|smoke|plume)|head out of the|(?:upwind|downwind)|light ?headed|dizzy|cyanide`,
    ),
    touched: pattern(
      String.raw`fumes?|smoke|smoking|vapou?rs?|spray paint|spraying|spray painting|flux|brake cleaner|brazing|soldering|lead|isocyanates?|two pack|solvents?|respirator|exhaust|off ?gas\w*|burning off`,
    ),
  },
  {
    topic: 'eyes',
    plain: pattern(
      String.raw`(?:glasses|goggles|safety glasses|safety specs|specs|safety squints|eye protection|face ?shield|visor|eyes?) ${ON}|(?:wear|wearing|put|get|grab|forgot|without|no|need|where's|lost|use) (?:\S+ ){0,3}?(?:safety glasses|safety specs|goggles|eye protection|face ?shield|visor|eyewear|glasses)|(?:safety glasses|eye protection|face ?shield)|(?:in|into|out of|near|for|from|lose|lost|losing|save|protect|took|take|mind|watch|keep|cover|close|shut|hit me in) (?:\S+ )?(?:my|your|the|his|an|both|one) eyes?|(?:arc|welder's|welders) (?:eye|eyes|flash|burn)|flash ?burn|flashed (?:myself|my|me)|sunburnt eyes|(?:look|looking|stare|staring|watch) (?:\S+ )?(?:at|into) (?:the|an|that|this) (?:arc|laser|light|beam|weld|flame|sun)|(?:helmet|hood|mask|lid|shade|screen)(?:'s)? (?:\S+ )?(?:down|up and look)|eyeballs?|blind(?:ed|ness)?|go blind|look away|eye ?wash|bits? (?:fly|flying|flies|everywhere in)|(?:chips|swarf|wires?|bristles|shrapnel|scale|slag|sparks) (?:\S+ ){0,3}?(?:fly\w*|flies|flew|ping\w*|shoot\w*|in your face|in my face|at your face|at my face)`,
    ),
    touched: pattern(
      String.raw`chips|swarf|wire wheel|wire brush|wire cup|chipping hammer|slag|laser|hot chips|scale|shards?|splinters flying`,
    ),
    unless:
      /\b(?:eye (?:bolt|bolts|nut|hook)|in my mind's|eyeball (?:it|that)|eyeballed|by eye|splash\w*|acid|caustic|bleach|keep an eye|looking in the eye|catch\w* (?:my|your) eye|blind (?:hole|nut|rivet)|sunglasses|reading glasses)\b/,
  },
  {
    topic: 'hearing',
    plain: pattern(
      String.raw`(?:ear )?(?:muffs|ear ?muffs|defenders|ear defenders|ear plugs|earplugs|plugs|ear protection|hearing protection|ears) ${ON}|(?:muffs|ear ?muffs|ear defenders|ear ?plugs|ear protection|hearing protection)|(?:cover|protect|mind|save|block|plug|hold|wreck\w*|ruin\w*|bad for|mind) (?:\S+ )?(?:your|my) (?:ears|hearing)|tinnitus|deaf|deafening|deafness|ears? (?:\S+ ){0,2}?ring\w*|go deaf|what did you say|lost (?:\S+ ){0,3}?hearing|turn (?:your|the) (?:volume|sound|headphones) down|headphone (?:warning|users)|(?:wear|wearing|put) (?:\S+ ){0,2}?(?:ears|muffs|plugs|defenders)`,
    ),
    touched: pattern(String.raw`loud|noisy|noise|jet engine|decibels?|racket|screams|screaming|din`),
    unless: /\b(?:spark plugs?|plug weld\w*|grow in the ears|wood plugs?|drain plugs?)\b/,
  },
  {
    topic: 'pinch',
    plain: pattern(
      String.raw`pinch(?:ed|es|ing|y)?(?: (?:point|points|your|my|hazard))?|(?:fingers?|thumbs?|hands?|fingertips?|toes|knuckles) (?:\S+ ){0,5}?(?:trapped|crush\w*|caught|squash\w*|jam\w*|nip\w*|out of (?:the way|there|it)|clear|away from|in between|between|in the (?:way|gap|hinge|jaws?|door|nip)|where they|off|flat|shut|goes|come|stay|closes|closing)|(?:trap\w*|crush\w*|nip\w*|squash\w*|squish\w*|jam\w*|shut|smash\w*|mash\w*|guillotine\w*|slam\w*|catch|lose|lost|losing|take|takes|took|have|chop\w*|shear\w*|flatten\w*|removes?|bit|bite|bites|ate|eat|eats|snip\w*|keep|mind|watch|count) (?:\S+ ){0,4}?(?:your|my|a|his|her|the|those|all ten|end of your|tip of your|tip of my|ten) (?:\S+ )?(?:fingers?|thumbs?|fingertips?|fingernails?|nails|knuckles|pinky|pinkie)|won't stop for (?:your|you)|between the \S+ and the \S+ when|crush (?:point|hazard|zone)|nip point|finger (?:trap|remover|chopper|muncher|eater)|black (?:thumb|nail|fingernail)|won't know you're there`,
    ),
    touched: pattern(
      String.raw`closes on|closing|press brake|folder|ram comes|jaws?|slams?|hinge|rollers|guillotine|shear|vise closing|come down on|comes down on|clamps down|scissor`,
    ),
    unless:
      /\b(?:blade|saw|lathe|router|spinning|grinder|jointer|planer|table saw|bandsaw|pinch of (?:salt|flux|borax)|at a pinch|in a pinch|feel a pinch|fingers crossed|cross\w* (?:my|your) fingers|rule of thumb|chuck|leak|hammer\w* (?:my|a))\b/,
  },
  {
    topic: 'fire',
    plain: pattern(
      String.raw`(?:catch(?:es)?|caught|on|sets?|set|setting|start(?:s|ed)?|starting|risk|cause[sd]?|house|shed|shop|barn|garage|grease|bush) (?:\S+ ){0,2}?(?:fire|fires|alight|ablaze)|(?:leave|left) (?:it|that|them|a \S+|the \S+) (?:lit|burning|unattended)|pilot light|fire (?:extinguisher|blanket|watch|bucket|brigade|department|hazard|risk|engine|trucks?|hose)|extinguisher|(?:burn|burnt|burned|burning|burns) (?:\S+ ){0,4}?(?:the (?:\S+ )?(?:down|shed|house|shop|place|garage)|down|yourself|your hand|my hand|my arm|myself|me|you|fingers?|skin)|(?:oily|linseed|finish|oil|solvent|wet|danish|used|those|the) rags?|rags? (?:\S+ ){0,6}?(?:flat|outside|water|bin|heap|pile|bucket|combust\w*|fire|hang)|spontaneous\w* combust\w*|(?:flammable|combustible|explosive|inflammable)|flash ?back|smoulder\w*|smolder\w*|(?:bucket|can|hose|spray bottle|jug|tub) of (?:water|sand)|(?:sparks?|spatter|slag|embers?|flame|torch|hot \S+) (?:\S+ ){0,8}?(?:sawdust|rags?|curtains?|petrol|gasoline|gas can|paint|wood|shavings|cardboard|solvent|thinners|fuel|straw|leaves|dry|overalls?|boots?|catch|catches|cuff|pocket)|(?:gas|propane|acetylene|lpg|petrol|gasoline) (?:\S+ ){0,8}?(?:floor|leak\w*|sinks?|sink|heavier|settles|pools?|boom|explod\w*|explosion|ignit\w*|blow up|pilot|spark|naked flame)|naked flame|open flame|(?:doesn't|don't|does not) look hot|(?:still|very|bloody|proper|stupid|really|red|black) hot (?:\S+ ){0,8}?(?:touch|burn|skin|hand|glove|pick)|black heat|(?:black|it's|that's|still) (?:\S+ ){0,2}?(?:not cold|hot enough)|whoosh|eyebrows|hot work|oil quench (?:\S+ ){0,4}?(?:flame|flare|fire|lid)|flare(?:s|d)? up|lid (?:\S+ ){0,4}?(?:flames?|flare|fire|quench)`,
    ),
    touched: pattern(
      String.raw`sparks?|torch|flame|flames|propane|petrol|gasoline|fuel|acetylene|oxy|quench|hot metal|embers?|thinners|lithium batteries|linseed|welding near|heat gun|forge|furnace|crucible|molten`,
    ),
    unless:
      /\b(?:your eyes|the eyes|eyeballs|fire (?:it|her|him|them|up|that) up|fired|fireplace|fire pit|fire away|fire door|on fire today|camp ?fire|fire brick|firebrick|rag (?:time|doll))\b/,
  },
  {
    topic: 'chemicals',
    plain: pattern(
      String.raw`(?:acid|caustic|lye|sodium hydroxide|hydrochloric|muriatic|sulfuric|sulphuric|bleach|ammonia|hardener|resin|epoxy|isocyanates?|thinners|acetone|paint stripper|stripper|solvents?|drain cleaner|etch\w*|brake cleaner|cement|lime|bluing salts|ferric chloride|chromic|hydrofluoric|antifreeze|methanol|ether|polyurethane|fiberglass resin|catalyst|mek|xylene|toluene|degreaser|pickling (?:paste|acid)|flux|battery acid|peroxide|wet concrete|concrete|adhesive|wood preservative|creosote) (?:\S+ ){0,8}?(?:skin|gloves?|gloved|burn\w*|goggles|eyes|splash\w*|sensiti[sz]\w*|allerg\w*|rash|toxic|poison\w*|nasty|corrosive|hands|rinse|wash\w*|neutrali[sz]\w*|careful|respect|hurt|blister\w*|drink|fizz|apron|strip your)|(?:gloves?|rubber gloves|nitriles?|nitrile gloves) (?:\S+ ){0,4}?(?:on|for|with|when|because|wear) (?:\S+ ){0,6}?(?:acid|caustic|epoxy|resin|hardener|chemical\w*|stripper|solvent|stuff|lye|concrete|cement|glue|this)|(?:acid (?:to|into) (?:the )?water|water (?:to|into) (?:the )?acid|acid burns?|chemical burns?|cement burns?|sensiti[sz](?:ed|er|ation)|data sheet|safety data|sds|msds|nitriles?|nitrile gloves|rubber gloves)`,
    ),
    touched: pattern(
      String.raw`acid|caustic|lye|epoxy|resin|hardener|chemicals?|stripper|acetone|thinners|bleach|isocyanates?|brake cleaner|etchant|pickle|pickling|muriatic|degreaser|bluing salts`,
    ),
    unless: /\b(?:kick\w*|flux core|lime wash|acid free|dust|sanding dust)\b/,
  },
];

/** A guard that is off belongs to the machine that is spoken of. */
export const GUARD_OFF = pattern(OFF);
export const GRINDS = /\b(?:grinder|grinding|disc|disk|cut off|cutoff|zip|abrasive|flap)\b/;

/** Somebody warns, or owns up to something. */
export const WARNS =
  /\b(?:never (?:ever|put|reach|stand|get|go|let|try|use|leave|weld|cut|open|lift|trust|touch|work|walk|do|turn|run|take|wear|grind|point|look|spray|pour|mix|store|be|stick|feel|lean)|(?:don't|do not) (?:you )?(?:ever|touch|put|reach|stand|get|go|let|try|use|do this|do that|do what|be|leave|breathe|lift|open|trust|rush|lean|wear|want to be|stick|point|look|spray|pour|mix|argue|mess)|mind (?:your|you don't|out|when|where|that|those|the)|be careful|careful|watch (?:your|out|yourself)|(?:keep|kept) (?:your|hands|fingers|them|everyone|everybody|kids|people|clear|back|away|well|out)|stay (?:clear|back|away|out|well)|always (?:wear|use|keep|unplug|check|make|put|have|let|turn|stand|clamp|do|lock|chock|tie|bleed|work|cut|pour|add|open)|make sure (?:you|your|it's|the|nobody|nothing|that)|(?:wear|wearing) |shouldn't|should not|should've|should have (?:worn|had|put|been)|not supposed to|do as i say|dangerous|danger|nasty|kill|kills|killed|hurts?|hospital|emergency room|burn you|burns you|burned me|burnt me|blind|lose (?:a|an|your|the)|lost (?:a|his|her) (?:finger|hand|eye|thumb|arm)|take your|have your|have the end|rip your|break your|i know i know|yes i know|lazy|stupid|idiot|naughty|bad idea|hard way|respect|terrifies|terrified|scares|scared of|frightens|poison\w*|toxic|sick|ill|shivers|fever|cough\w*|lungs|breath(?:e|ing)|cancer|safety|clear of|stand (?:clear|back|to one side|off)|without (?:a|my|the|any) (?:mask|guard|glasses|gloves|goggles|shield)|not wearing|forgot (?:my|the|to wear)|get somebody|get someone|licen[sc]ed|qualified|professional|warning|warn|told off|tell (?:my|the) (?:mum|mom|wife|insurance)|ask me how i know|learned that|scar|scars|stitches|bleed\w*|blood|injur\w*|accident|caution|hands? (?:back|clear|off)|get you|bite you|bites|unforgiving|won't forgive|second chances?|not a toy|not messing|not joking|not kidding|i'm serious|seriously|be warned|at your own risk|don't be me|don't be like me)/;
