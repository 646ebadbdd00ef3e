/**
 * Words that say what they say: a part is never read from one of them for its sound alone. Our own list: the words
 * that tie speech together, and everyday and shop words that are heard for themselves.
 */
export const TIES: ReadonlySet<string> = new Set(
  `a an the this that these those my your our his her its their and or but so if then than as at by for from in into of off on onto out over
under up down to too with without is are was were be been am do does did done has have had having will would can could should may might must
i you he she it we they me him them us who what which where when why how not no yes yeah okay ok right well now just only also even still yet again
here there all any some each every both either one two three four five six seven eight nine ten first second third last next other another
more most much many few little bit lot really very quite pretty about around through between because cause while until before after like
get got gets getting go goes going gone come comes came coming make makes made making take takes took taking put puts putting
it's i'm i've i'll i'd that's there's what's here's he's she's they're we're you're don't doesn't didn't won't can't isn't aren't wasn't
let lets let's gonna wanna kind sort thing things stuff way today tomorrow yesterday`.split(/\s+/),
);

export const EVERYDAY: ReadonlySet<string> = new Set(
  `welding welder weld grinding grinder drill drilling lathe mill milling saw sawing sand sanding paint painting plan planning plane planer planing
plenty please people person place places spot sport spout? spend point pole poles pool pull pulled pulling push pushing pushed poly pile pallet
plate plates plastic platter planted plant pretty present pressed pressing pressure price part parts party path pattern pick picked piece pieces pin pipe pit
bearing? beating bending being bench boring bent best better big bike bit black blade block blow blue board body bolt bolts book bottom bought bowl box boy brake
brass break bring broke brother brown brush bucket build building built bumper burn burning bus bush busy button buy cable call called camera car card care
case cast cat catch center chain chair chance change channel cheap check chicken chip chisel circle clamp clamps clean cleaning clear close closer cloth coat cold
color comment comments concrete copper corner cost couple course cover crack cross crowd cup cut cuts cutting cutter dad damage day days deal deep depth design different
dirty dog dollar door double drawing drawer dress dry dust early easy edge end ends engine enough episode evening everything exactly expensive extra eye eyes face fact fair
fall family fan far farm fast feel feels feet file film final find fine finger fingers finish finished fire fit fits fix flat flip floor fly follow foot force forget form found
frame friend front full fun funny garage gear glass gloves glue good grab great green grey grip ground guess guide guy half hammer hand hands hang happen happy hard hat head hear
heard heat heavy height hello help high hit hold holding hole holes home hope hoping hopefully hopping hot hour hours house huge hundred idea inch inches inside instead iron job joint judge keep
key kid kids kill kitchen knife know known lack ladder lady large later lay layer lead leak learn least leave left leg length less letter level lift light line list live load local long longer look
looking lose loud love low luck lucky lumber lunch machine mark marks match matter mean measure medium meet mess metal middle mind minute minutes miss mistake model money month months morning motion mount move
moving muffin music nail name narrow near neat neck need needle new nice night noise normal nose note nothing number nut nuts oil old open order outside oven own pack pad pair panel paper
parking pass pay perfect phone photo picture plain play pocket poor possible post power practice proper proud question quick quiet rack rain reach read ready real reason red remember rest right rip ripping ripped
road rod roll roof room rope rough round row rub rubber rule run running rust safe same sandwich save say scale scrap screw screws seal season seat see seems send sense set sharp shed sheet shelf shift shine shoe shop
short shot shout show shown shower side sides sign simple sit size skin slat slide sliding slip slot slow small smell smoke smooth soft solid something sound spare spark special speed spend spin splash split spray spread spring square
stack stage stand standing start station stay steal steam steel steep step stick still stock stone stop stopped stopper store story straight strange street stretch stretched strike string strip strong structure stuck stuff stupid style sugar summer super supper supply support sure
surface sweet swing switch table tack tacked tail talk tall tank tape tapping task taste taught team tear tell terrible test thanks thick thin think thread throw thumb ticket tidy tie tight tile time times tin tiny tired
together tomorrow tool tools tooth top total touch tough town track train tray treat tree trick trip trouble truck true trust try trying tube turn turned turning twist type ugly uncle upright? usual van vice video view vise visit voice wait walk wall want warm
wash washer washing waste watch water weather week weekend weeks weigh weight welcome west wet wheel? white whole wide wife wild win wind window wire wobble wood wooden word words work working world worry worse worst worth wrap write wrong yard year years yellow young
copper hopper? chopper shopper mortar motor? modern mother matter metre meter butter better batter litre letter ladder louder powder planner runner winner spinner dinner inner center sander sender cylinder? bolder border burner bumper badger ledger larger ranger anger finger folder
cutter gutter gasket basket bracket bucket pocket socket rocket jacket ticket packet market target carpet cricket blanket budget gadget fidget midget widget rivet river liver lever? never clever over other rather brother weather leather feather father`
    .split(/\s+/)
    .filter((word) => !word.endsWith('?')),
);
