/**
 * What stands before and behind a number in a shop, and what it then is. Our own lists, of words that any trade
 * uses; each is matched against the few words beside a number.
 */
const words = (list: string) =>
  `(?:${list
    .trim()
    .split(/\s*\|\s*|\s*\n\s*/)
    .join('|')})`;

/** A tool that is called by its size; the size is not of the work. */
export const TOOL_BEHIND = new RegExp(
  `^(?:(?:angle|bench|drill|router|end|hole|cordless|flap|cutting|cut|off|hex|allen|wire|chop|circular|band|table|miter|mitre|ball|open|ring|combination|ratchet|impact|deep|steel|carbide|cobalt|masonry|forstner|spade|step|brad|point|slitting|grinding|diamond|cup|finishing|paint|foam|digital|vernier|machinist|bar|sash|pipe|g|f|c|sds|hammer|ball|peen|cold|wood|mortise|firmer|center|centre|roughing|corner|flush|trim|round|over|straight|spiral|compression|insert|hss|indexable|face|fly|shell|side|tile|jig|scroll|mig|tig|knurling|lump|sledge|claw|filling|tin|crimp|stepped|key|roll|parallel) ){0,3}${words(`
  grinder|drill|drills|bit|bits|endmill|endmills|mill|cutter|cutters|spanner|spanners|wrench|socket|sockets|blade|blades|saw|saws|bandsaw|chisel|chisels|vise|vice|hammer|reamer|punch|brush|roller|lathe|clamps?|driver|drive|key|keys|collet|chuck|calipers?|callipers?|rule|ruler|tape|jointer|planer|thicknesser|sander|disc|discs|disk|disks|file|trowel|nozzle|cup|tip|shroud|gun|torch|screen|monitor|telescope|anvil|swage|fuller|knife|needle|nailer|nails|gouge|tap and die|die|dies|edge finder|magnet|stone|wheel brush|broom|bucket
`)}(?= |$)`,
);

/** Words behind a length that say which way it goes. */
export const WAY_BEHIND = new RegExp(
  `^(?:and (?:a bit|change) )?${words(`
  long|wide|tall|high|deep|thick|across|apart|diameter|dia|square|centers|centres|on centers?|on centres?|wall|walled|outside|inside|radius|rad|round|bore|overall|in diameter|in length|in from|up from|down from|from the|off|under|over|above|below|out|proud|shy|short|oversize|undersize|clearance|gap|per pass|a pass|each pass|each side|a side|per side|of clearance|of slop|of play|of run ?out|of backlash|of float|of lift|of travel|of stroke|of overlap|of overhang|of kerf|of adjustment|of movement|of meat|of material|bigger|smaller|longer|shorter|lower|higher|narrower|wider|too|at the|to the|between|all round|all around|end to end|edge to edge|on the nose|shoulder|reveal|overhang|bevel|chamfer|roundover|fillet|rebate|rabbet|dado|groove|slot|hole|holes|pilot|lip|flange|offset|stickout|recess|pocket|step|spacer|shim|packer
`)}(?= |$)`,
);

/** Stock that is called by a thickness or a section: quarter plate, 3/4 ply. */
export const STOCK_BEHIND = new RegExp(
  `^(?:(?:hot|cold|rolled|mild|stainless|bright|black|aluminium|aluminum|brass|copper|steel|baltic|birch|marine|structural|flat|square|round|solid|silver|hardwood|oak|maple|walnut|ash|pine|cherry|mdf|clear|galvanised|galvanized|checker|chequer|tool|spring|a36|rigid|threaded|old|new) ){0,3}${words(`
  ply|plywood|plate|sheet|sheets|bar|flat|flats|flatbar|angle|angles|channel|channels|tube|tubes|tubing|pipe|pipes|box|boxes|rod|round|square|stock|hot rolled|cold rolled|mdf|board|boards|steel|stainless|aluminium|aluminum|brass|copper|acrylic|perspex|polycarbonate|glass|hardwood|oak|maple|walnut|pine|ash|timber|timbers|planks?|planking|strips?|slats?|bolts?|bolt|screws?|pins?|dowels?|studs?|stud|rebar|mesh|rope|cable|hose|hoses|line|fillet|weld|bead|chamfer|radius|roundover|rebate|rabbet|dado|groove|slot|hole|holes|gap|wall|bore|shaft|keyway|key|washers?|shims?|spacers?|foam|rubber|leather|felt|gasket|cable|insert|thread|threads|lag|lags|hex|bearing|bushing|fiberglass|fibreglass|slab|gravel|base|aggregate|copper pipe|conduit|trunking|wire|cores?
`)}(?= |$)`,
);

/** What may follow a number that stands for itself; anything else would be what is counted. */
export const FREE_BEHIND =
  /^(?:$|(?:and|but|so|because|cause|which|it|it's|that|that's|this|they|they're|these|those|i|i'm|i'll|i've|i'd|we|we're|you|he|she|on|in|at|for|to|if|when|now|then|or|not|no|as|from|with|there|there's|is|isn't|was|here|right|okay|ok|like|all|just|until|till|by|where|before|after|than|instead|exactly|plus|minus|give|ish|dead|bang|spot|again|today|max|tops|actually|maybe|sorry|hang|rather|well|up|across|either|though|only|the|a|anyway|once|nothing|works|seems|felt|feels|did|does|has|had|will|would|could|should|please|yeah|yep|next|first|one|what|why|how|while|since|per|each|both|between|flat|if|nice|perfect|good|great|lovely|big|with|let's|we'll|we've|and|too)(?= |$))/;

/** Words before a length that is not of the build: a person, a building, a distance to keep. */
export const OUTSIDE_BEFORE =
  /\b(?:(?:shed|garage|shop|workshop|van|truck|trailer|yard|garden|house|room|driveway|road|field|cat|dog|lad|kid|kids|wife|husband|son|daughter|brother|sister|dad|father|mum|mom|mother|uncle|grandad|grandfather|boy|girl|he|she|he's|she's|i'm|who's|bloke|guy|fella|man|woman|snow|rain|extension (?:lead|cord)|ceiling|doorway|the lead|tape)(?:'s)?(?: (?:is|are|was|only|about|nearly|just|maybe|like|a|all of|over|under)){0,3}|(?:stand|stay|stood|keep|get|move|step|walk|walked|drop|dropped|threw|fell|drove|back)(?: \w+){0,2}|within|swings|lathe takes|give (?:him|her|them|it|you)) $/;
export const OUTSIDE_BEHIND =
  /^(?:away|back|from me|from you|from the (?:camera|house|road)|tall (?:and he|and she|guy|man|bloke)|of (?:snow|rain|water|mud|dust|sawdust|extension|hose pipe|lead|footage|my life|film|tape)|down the (?:road|street)|in the air|clear of|of here|or so away)\b/;

/** A thing that is bought for what it can bear. */
export const LIFTING_BEHIND = new RegExp(
  `^(?:(?:chain|engine|trolley|floor|bottle|scissor|cable|wire|rope|gas|drawer|shop|beam|lever|hand|lock|locking|soft|close|heavy|duty|swivel|lifting|ratchet|tie|down|electric|hydraulic|plate|bench|capacity|rated|load|pull|air) ){0,3}${words(`
  hoist|winch|chain|sling|slings|strap|straps|strop|strops|shackle|shackles|jack|jacks|press|crane|magnets?|slides?|runners?|castors?|casters?|wheels?|hinges?|struts?|springs?|cylinder|ram|actuator|trolley|lift|cell|rope|cable|hooks?|eyes?|bolts?|beam|stands?|block|blocks|pulley|pull|breaking|capacity|rated|rating|come along|turfor|motor|bushes|mounts?|clamps?|axle|tyres?|tires?|hitch
`)}(?= |$)`,
);

/** What a bought thing bears is spoken of with one of these. */
export const RATED =
  /\b(?:rated|rating|rates|good for|good to|max|maximum|maxes out|capacity|safe working|working load|swl|wll|breaking|holds?|hold up to|(?:will|can|should|it'll|to) (?:hold|lift|take|pull|push|handle|carry|give|do|make|put out)|lifts|pulls|pushes|carries|handles|proof|stamped|tops out|puts? out|gives?|delivers?|nameplate|name plate|plate says|says on|they call it|they say|burst|bursts)\b/;

/** Somebody sets something. */
export const SET =
  /\b(?:set|sets|setting|setted|adjust\w*|crank\w*|dial\w*|wound|wind|turn(?:ed)?|backed|regulat\w+|regulator|relief|cracks?|opens|preload\w*|test\w*|charged|pumped|inflat\w+|blow\w*|spray\w*|gun|line pressure|knock\w*|drop\w*|down to|up to|running|run it|compressor at|purge|argon|oxygen|acetylene|propane|gas)\b/;

/** Weighing something. */
export const WEIGHED =
  /\b(?:weighs?|weighed|weighing|weight|heavy|heavier|of (?:steel|wood|timber|concrete|sand|stuff|rubbish))\b/;

/** Supply, and what is plugged into it. */
export const SUPPLY =
  /\b(?:breaker|breakers|mcb|rcbo|spur|fuse|fused|fuses|plug|socket|supply|circuit|outlet|outlets|rated|rating|draws?|pulls|contactor|relay|switch|starter|isolator|main|mains|battery|charger|alternator|solenoid|coil|phase|transformer|power supply|extension|cable|feed|rcd|panel|inverter|controller|driver|esc|motors?|steppers?|fans?|heater|pump|compressor)\b/;

/** Somebody welds. */
export const WELDING =
  /\b(?:weld\w*|mig|tig|stick|arc|rods?|electrodes?|tack\w*|bead|beads|root|fillet|penetration|burn\w*|blown?|undercut|wire|puddle|cap|hot start|arc force|seventy eighteens?|sixty thirteens?|7018s?|6013s?|6010s?|6011s?)\b/;

/** Heat that is meant to be. */
export const HEATED =
  /\b(?:oven|kiln|forge|furnace|preheat\w*|pre heat\w*|temper\w*|quench\w*|anneal\w*|normali[sz]\w*|torch|heat\w*|bake|baked|baking|cure|cured|curing|boil\w*|melt\w*|solder\w*|iron|hot plate|temperature|temp|warm\w*|soak\w*|steam\w*|interpass|critical|steel|hot|oil|bath|thermometer|thermocouple|pyrometer|nozzle|bed)\b/;

/** Time that a process takes, and time that the maker spends. */
export const CURED =
  /\b(?:clamps?|clamped|cure|cures|cured|curing|set up|to set|sets|glue\w*|epoxy|resin|dry|dries|dried|drying|coats?|coated|soak\w*|oven|kiln|bake\w*|temper\w*|preheat\w*|quench\w*|anneal\w*|forge|leave it|left it|let it|let that|let them|let those|sit|sits|rest|rests|pickl\w*|etch\w*|acid|vinegar|steep\w*|steam\w*|boil\w*|harden\w*|paint|primer|varnish|lacquer|shellac|oil|concrete|mortar|grout|screed|forms|formwork|hold it|hold that|held|dwell|post flow|pre flow|press time|vacuum|under pressure|at temperature|at heat|flash|tack free|recoat|citric|molasses|electrolysis|tank|dip\w*)\b/;
export const SPENT =
  /(?:\b(?:took|takes me|take me|taking me|spent|spend|spending|been|lost|wasted|it's been|last|drove|drive|slept|waited|waiting|timed|worked|working|only (?:a|got)|every|at least|for me|i've got|i had|got about|another|in about|me about|me a good|me the best part of)(?: (?:about|nearly|over|like|me|a|good|the|another|maybe|only|just|almost|in))*) $/;
export const SPENT_BEHIND =
  /^(?:ago|later|late|job|drive|video|videos|away|old|long|of (?:my|footage|swearing|work|sanding|filing|grinding|welding|driving|video|film|sleep)|work|walk|i timed|each way|round trip|on the phone|flat|every (?:day|night|week)|a (?:day|week|night)|and i|of it)\b/;

/** Grains of abrasives that are made: FEPA P grades and their older neighbours. */
export const GRITS: ReadonlySet<number> = new Set([
  24, 36, 40, 50, 60, 80, 100, 120, 150, 180, 220, 240, 280, 320, 360, 400, 500, 600, 800, 1000, 1200, 1500,
  2000, 2500, 3000, 5000,
]);
export const SANDED =
  /\b(?:sand|sands|sanded|sanding|sander|sandpaper|grit|grits|flap|abrasive|paper|wet and dry|linish\w*|polish\w*|ston(?:e|ed|ing)|hon(?:e|ed|ing)|orbital|belt sander|hand sand|scratch\w*|scuff\w*|key it)\b/;
export const PAPER_BEHIND =
  /^(?:(?:flap|sanding|wet|grit|zirconia|ceramic) )?(?:grits?|paper|papers|disc|discs|disk|disks|pad|pads|belt|belts|sandpaper|flap|mesh|wet and dry|scotch|stone|block|wheel|abrasive)\b/;
