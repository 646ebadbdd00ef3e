import { saying, type Saying } from './remark.ts';

const SEEN =
  /\b(?:if (?:you|the camera|that|this|it) (?:can|could|'ll|is|came|comes|shows|will|picks)|you can (?:see|hear|tell)|came through|in focus|on camera|picked that up|mentioned|i (?:said|told|showed)|why|what (?:that|it) (?:was|is)|who (?:to|decided|designed)|not sure how i (?:feel|did))\b/;

/** Ways in which makers say that they have not decided yet. */
export const UNDECIDED: readonly Saying[] = [
  saying(
    'not decided',
    String.raw`(?:not|haven't|hasn't|have not|never|still not|nothing|isn't|not been|hadn't) (?:\S+ ){0,2}?(?:decided|settled|worked out|figured out|made (?:my|our) minds?(?: up)?|made up (?:my|our) minds?|committed)`,
    0.9,
    SEEN,
  ),
  saying(
    'mind not made up',
    String.raw`(?:not|haven't|can't|cannot|couldn't|never|don't) (?:\S+ ){0,2}?(?:made?|make) (?:my|our|up my|up our) minds?`,
    0.9,
  ),
  saying(
    'cannot decide',
    String.raw`(?:can't|cannot|can not|couldn't|unable to|struggling to|trying to|need to|have to|got to|gotta|yet to|got yet to|still to|must|still) (?:\S+ )?(?:decide|decide on|choose|pick one)(?! to )`,
    0.8,
    /\b(?:you|they|he|she|cat|dog) (?:\S+ )?(?:decide|choose)\b/,
  ),
  saying(
    'do not know',
    String.raw`(?:don't|do not|dunno) ?(?:really |quite |actually |even )?(?:know )?(?:yet )?(?:whether|if) (?:it|i|i'll|i'm|to|we|we'll|this|that|they|these|it's|it'll|the)`,
    0.75,
    SEEN,
  ),
  saying(
    'do not know yet',
    String.raw`(?:don't|do not|not) (?:\S+ ){0,2}?(?:know|sure|certain) yet|dunno (?:yet|which|what)|yet to be decided|to be decided|tbd|(?:haven't|have not|hadn't|not) (?:a|the) (?:clue|foggiest)|still no idea|remains to be seen|don't know (?:yet )?(?:which|what) (?:\S+ ){0,3}?(?:to use|to do|to go|i'll|i'm|we'll|it'll)`,
    0.75,
    SEEN,
  ),
  saying(
    'torn',
    String.raw`(?:torn|dithering|wavering|going back and forth|gone back and forth|going round and round|going round in circles|humming and hawing|umming and ahhing|hemming and hawing|wondering|flip flopping|flip flop|debating|toying|deliberating|wrestling|arguing with myself)(?: \S+){0,3}? (?:between|about|over|on|with|whether|if)`,
    0.8,
    /\b(?:wondering (?:if|whether|about) (?:you|anyone)|i wonder)\b/,
  ),
  saying(
    'in two minds',
    String.raw`(?:in|of) two minds|(?:keep|kept|keeps) (?:on )?changing (?:my|our) minds?|on the fence (?:about|on|over|whether|with|between|here|still)|still on the fence|toss up|tossing up|jury(?:'s| is) (?:still )?out|coin (?:toss|flip)|flip a coin|toss a coin|(?:still|all|bit) up in the air|open question|undecided|could go either way|fifty fifty|can't choose|sleep on (?:it|that)|have a think|need to think|thinking about it|chew on (?:it|that)|mull\w*(?: that| it)? over`,
    0.75,
    /\b(?:chuck|hang|throw|lift|arms?) (?:\S+ )?up in the air\b/,
  ),
  saying(
    'not sure whether',
    String.raw`(?:not|isn't|ain't|never) (?:\S+ )?(?:sure|certain|convinced) (?:yet )?(?:whether|if|about|which|what to|how (?:to|i)|between)`,
    0.7,
    SEEN,
  ),
  saying(
    'either or',
    String.raw`(?:either|maybe|might be|could be|perhaps) (?:\S+ ){1,8}?or (?:maybe |perhaps |possibly )?(?:\S+ ){1,8}?(?:we'll see|i'll see|haven't|don't know|not sure|who knows|dunno|can't decide|see how)`,
    0.7,
  ),
  saying(
    'might or might',
    String.raw`(?:i|we|it) might (?:\S+ ){1,8}?(?:or|and) (?:(?:i|we|it) )?(?:might|may) (?:not|\S+)|(?:still thinking|thinking) (?:\S+ ){0,3}?(?:whether|if|between|about whether)|leaning towards?|we'll see whether|i'll decide|decide (?:later|next|when|on the day|once)|(?:is it|should it be|do i go|do i use|do i) (?:\S+ ){1,6}?or (?:is it|should|do i|steel|wood|\S+) (?:\S+ ){0,3}?(?:dunno|don't know|not sure|can't decide|haven't decided)`,
    0.7,
  ),
];

/** Ways in which makers ask their viewers for something. */
export const ASKS: readonly Saying[] = [
  saying(
    'tell me',
    String.raw`(?:please |so |do |just |and |then |you can |could you |can you |somebody |someone |anybody |or )?(?:tell|show|teach) (?:me|us)(?: (?:down|below|in|how|what|which|if|whether|where|why|who|about|please|your|the|your way|that))`,
    0.75,
    /\b(?:(?:gonna|going to|will|always|keep|keeps|to|they|she|he|people|you'll|you|they'll|don't|didn't|never|wouldn't|nobody|everyone|everybody|it'll|that'll|used to|would|can|let|did|does) (?:tell|show|teach)(?: me| us)|tell me (?:about it|i'm|it's|that's|off|to))\b/,
  ),
  saying(
    'let me know',
    String.raw`(?:let (?:me|us) know|lemme know)`,
    0.85,
    /\b(?:let (?:me|us) know (?:when the|he|she)|(?:they|he|she|they'll|he'll|she'll|to|didn't|never) let me know)\b/,
  ),
  saying(
    'send me',
    String.raw`(?:send|mail|email|post|message|drop|point|lend|sell) (?:it |one |them |that |those )?(?:me|us)(?: |$)(?:\S+)?`,
    0.75,
    /\b(?:(?:they|he|she|they'll|he'll|didn't|to|will|would|gonna|supposed to|who|that|nobody|supplier|shop) (?:send|mail|email|post|message|drop|point|lend|sell)|(?:sell|send) me (?:a bill|an invoice))\b/,
  ),
  saying(
    'write in',
    String.raw`write in|writes? to me|drop (?:me |us )?(?:a|your) (?:comment|line|note|message|suggestion|suggestions|guess|guesses)|leave (?:me |us )?(?:a|your) (?:comment|suggestion|suggestions|thoughts|answer|answers|guess|idea|ideas)|give (?:me|us) (?:a shout|your|a hint)|shout (?:out )?(?:in|if|at me)|get in touch|hit me up|put (?:it|them|your \S+|a|that) (?:\S+ )?in the comments|pop (?:it|them|a \S+) (?:\S+ )?in the comments|stick (?:it|them|a \S+) (?:\S+ )?in the comments|answers? (?:on a postcard|below|in the comments)|comment below|chime in|weigh in|educate me|correct me|put me right|help me out|over to you`,
    0.8,
    /\b(?:don't (?:\S+ )?(?:write in|comment|leave)|wrote in|no need to|leave a (?:like|comment and subscribe)|before you (?:all )?(?:write|comment)|yes i know)\b/,
  ),
  saying(
    'does anyone',
    String.raw`(?:does|do|has|have|is|can|could|would|did|if) (?:any of you|anyone|anybody|any one|someone|somebody|any body|one of you|you lot|you guys) (?:\S+ )?(?:know|knows|have|has|got|had|make|makes|tried|seen|out there|who|can|could|done|used|worked|remember|recogni[sz]e|recogni[sz]es|ever|want|sell|sells|thinks?|'s|tell|explain|find)`,
    0.8,
    /\b(?:if (?:anyone|anybody) (?:asks|says|tells|wants to (?:know|buy)))\b/,
  ),
  saying(
    "if anyone's got",
    String.raw`if (?:anyone's|anybody's|someone's|somebody's|any of you's|any of you have|you've|you have|you happen to have|you happen to know|you know|you guys know|you lot know|any of you know|anyone's got) (?:\S+ ){0,12}?(?:tell|let|send|write|comment|comments|shout|email|please|i'd|point|drop|get in touch|message|share|give|say|i want|i'm all ears|i need)`,
    0.8,
  ),
  saying(
    "anyone's",
    String.raw`(?:anyone|anybody)(?:'s| has| have)? (?:got|had|know|knows|tried|done|seen)`,
    0.6,
    /\b(?:if|has|have|does|for|not|as good as|than|like|what|hope) (?:anyone|anybody)\b/,
  ),
  saying(
    'what would you',
    String.raw`what(?:'s| is) your (?:take|view|vote|preference|favou?rite|guess|opinion|advice|thinking|way)|what are your thoughts|comments please|(?:what|which|how|where) (?:would|do|should|did|one would|way would|way do|color would|colour would) you(?: guys| lot| all)? (?:do|use|think|go|make|pick|choose|reckon|prefer|call|put|fix|stop|solve|get|like|have)`,
    0.65,
    /\b(?:you (?:think|make|like) (?:of that|i)|what do you think you)\b/,
  ),
  saying(
    'like to know',
    String.raw`(?:i'd|i would|we'd) (?:really |genuinely |honestly |actually |dearly )?(?:love|like|appreciate|be grateful|be interested|be glad|pay)(?: to)? (?:\S+ )?(?:know|hear|see|suggestions|ideas|help|a photo|a picture|your|it|any)|i (?:genuinely |really |actually |honestly |do )?(?:want|need) to (?:know|hear) (?:what|how|if|whether|which|your|from)|(?:i'm|we're|i am) (?:all ears|open to|looking for|after|hunting for|on the hunt for|in the market for) (?:\S+ ){0,4}?(?:suggestions|ideas|advice|photos?|pictures?|if|so|a|an|one|someone|somebody)`,
    0.65,
    /\b(?:after (?:a|an|the) (?:while|bit|few|day)|looking for (?:my|a (?:nice|good)|the))\b/,
  ),
  saying(
    'ideas',
    String.raw`(?:any|your) (?:ideas|suggestions|thoughts|tips|advice|guesses)(?: (?:welcome|below|gratefully|please|in|on|down|for|would|about))?|suggestions (?:welcome|please|below|in the)|ideas (?:welcome|please|below|in the)|help (?:wanted|needed|please)|vote (?:in|below|now)|guesses (?:in|below|please)`,
    0.7,
    /\b(?:your (?:thoughts|ideas|advice) (?:was|were|is|last|on the last)|thanks for|thank you for|without any (?:ideas|help|advice)|had any (?:ideas|thoughts)|against any|took your|got your|read your|any thoughts of)\b/,
  ),
];

/** Ways in which makers say that work was, or will be, done with the camera off. */
export const UNFILMED: readonly Saying[] = [
  saying(
    'off camera',
    String.raw`off (?:the )?(?:camera|screen|film|cam)|camera(?:'s| was| is| being)? (?:off|switched off|turned off|not on|not running|wasn't on|wasn't running|dead|died|flat|charging|on charge|packed up|conked out|overheated|full)|without (?:the )?(?:camera|filming|you)|(?:with )?no camera|(?:had|has|borrowed) the camera|(?:didn't|couldn't|never|forgot to) (?:\S+ ){1,3}?(?:the |my )camera|(?:away from|behind) the camera|not on camera|behind the scenes|between (?:videos|episodes|takes|shoots)`,
    0.9,
    /\b(?:turn(?:ed)? the camera off now|off camera (?:light|mic|angle))\b/,
  ),
  saying(
    'not filmed',
    String.raw`(?:didn't|did not|wasn't|weren't|not|won't|isn't|never|couldn't|can't|haven't|hadn't|nobody|forgot to|forgotten to|without|wouldn't|doesn't|ain't) (?:\S+ ){0,4}?(?:film|filmed|filming|recording|record|recorded|rolling|capture|captured|on film|on video|on tape|get (?:any |the |it |that |this )?(?:footage|on camera|on film|on video)|shoot (?:it|that|any|the)|got (?:any )?footage|have (?:any )?footage|show (?:you )?(?:that|this|it) (?:bit|part))`,
    0.85,
    /\b(?:record (?:player|breaking)|world record|if i (?:didn't|wasn't)|not (?:film|filming) (?:at|in) this)\b/,
  ),
  saying(
    'camera failed',
    String.raw`(?:battery|batteries|card|memory card|sd card|phone|memory) (?:\S+ ){0,3}?(?:died|dead|ran out|run out|flat|full|charging|corrupted|filled up|gave up|gave out|packed up|went|was off)|(?:forgot|forgotten|failed|neglected) to (?:hit|press|push|turn|switch|start) (?:\S+ ){0,3}?(?:record|camera|button|on)|(?:lost|no|missing|deleted) (?:the |all the |that |my )?footage|footage (?:is|was|got|has|went) (?:gone|lost|corrupted|deleted|missing|wiped)`,
    0.8,
    /\b(?:drill|driver|impact|truck|car|van|tractor) battery\b/,
  ),
  saying(
    'missed',
    String.raw`you (?:missed|didn't (?:see|miss much)|haven't missed|won't see|won't get to see|never saw|don't see|don't get to see|don't need to (?:see|watch)|didn't get to see|don't want to (?:see|watch))|(?:since|from when|than when) (?:you|i) (?:last|were last) (?:saw|here|see)|since (?:we|you) last`,
    0.7,
    /\b(?:if you missed|in case you missed|you missed the (?:last|first)|you don't see (?:many|that|one|those)|you won't see (?:it|that) (?:again|when|once|from|because))\b/,
  ),
  saying(
    'spared',
    String.raw`(?:spare|spared|save|saved) you (?:the|all|that|from|watching|another|\S+ing)|(?:bore|bored|boring) you with|(?:make|made) you (?:watch|sit through)|won't (?:show|make) you (?:all|the whole|every|the rest|watch|that|sit)|(?:not (?:going to|gonna)|no point|no need to|didn't|couldn't) (?:show|showing) you`,
    0.75,
    /\b(?:save you (?:money|time|some|a (?:lot|fortune|trip)))\b/,
  ),
  saying(
    'done meanwhile',
    String.raw`(?:did|done|finished|made|cut|welded|drilled|painted|fitted|glued|sanded|wired|assembled|bolted|turned|got) (?:\S+ ){0,8}?(?:while you (?:were|weren't)|when you weren't|last night while|without you|while nobody was (?:looking|watching)|while no one was watching|in the meantime)|through the magic of|magic of (?:television|editing|video|tv|the internet)|here's one i (?:made|did|prepared) earlier|cut (?:to|ahead)|(?:i'll|i will|i'm going to|gonna) (?:do|finish|make|get) (?:\S+ ){0,8}?(?:tonight|overnight|later on my own|on my own time|before next time|before the next (?:one|video|episode))`,
    0.65,
    /\b(?:cut to (?:length|size|fit|the line))\b/,
  ),
];

/** Ways in which makers say that something ordered has come. */
export const ARRIVALS: readonly Saying[] = [
  saying(
    'turned up',
    String.raw`(?:has |have |'ve |finally |just |all |both |eventually |actually |\S+ )?(?:turned up|arrived|showed up|been delivered|got delivered|was delivered|were delivered|delivered)(?: (?:today|this|yesterday|last|finally|on|at|in|from|and|so|the|while|after|early|late|safe|with|about|by|a|right|bent|broken|damaged|wrong|except|but|which|as))?`,
    0.8,
    /\b(?:hasn't|haven't|not|never|yet to|when (?:it|they|the \S+|the \S+ \S+)(?: has| have)?|until|till|if|once|hadn't|before (?:it|they)|should have|would have|supposed to (?:be|have)|waiting|(?:wife|husband|mate|neighbou?r|cat|dog|kids|police|mother|brother|sister|dad|he|she|i|we|postman|i've|guests|rain|winter|spring|summer) (?:has |have |finally |just |'s )?(?:turned up|arrived|showed up)|turned up (?:the|to|at|a|about|nose|on edge)|turned up \w+ (?:amps|heat))\b/,
  ),
  saying(
    'came',
    String.raw`(?:came|come|has come|have come|'s come|comes) (?:today|yesterday|this morning|this week|this afternoon|(?:on )?(?:monday|tuesday|wednesday|thursday|friday|saturday|sunday)|last (?:night|week)|in (?:the post|the mail|today|yesterday|this)|in from (?:the|my)|through the (?:post|door)|by (?:courier|post|truck|mail)|in a (?:box|crate|tube|jiffy|padded)|from (?:the )?(?:supplier|metal place|steel yard|foundry|laser|factory|merchant|merchants|machine shop|waterjet|galvanizer|galvaniser|powder ?coater|china))|both came|all came|finally came|what did come|did come|came (?:early|late|quick|quickly|well packed|wrapped)`,
    0.8,
    /\b(?:(?:mate|wife|neighbou?r|he|she|i|we|you|somebody|someone|who|dad|brother|idea|cat|rain|rust|smoke|came) (?:\S+ )?(?:came|come)|welcome|(?:didn't|hasn't|haven't|doesn't|won't|not|will|to|until|when it|if it) (?:\S+ )?come)\b/,
  ),
  saying(
    'is here',
    String.raw`(?:finally|now|at last|look what) (?:here|arrived|got here|landed)|look what (?:came|turned up|arrived|the postman|the post)|(?:is|are|'s) (?:finally|at last|now|all) (?:here|in)|(?:is|are) here (?:at last|finally|now|today|and (?:they|it|i))|(?:that's|it's|they're) here at last|(?:has|have|'s|'ve|just) (?:finally |just )?landed|got (?:my|the|our) (?:delivery|parcel|package|order|parts|box|new \S+)(?: (?:today|this|from|in|yesterday))|(?:delivery|parcel|package|courier|postman|mailman|mail|post|post van|freight|pallet|truck) (?:\S+ ){0,3}?(?:brought|dropped|delivered|left|came|arrived|turned up|with the|has the)|(?:unbox|unboxing|unpack|unwrap|opening) (?:the|this|my|these)|(?:they|it|these|the \S+) (?:finally )?got here`,
    0.7,
    /\b(?:hasn't|haven't|not|never|waiting|hang on|if|when|until)\b/,
  ),
  saying(
    'in the post',
    String.raw`(?:came|turned up|arrived) (?:\S+ ){0,6}?(?:wrong|broken|damaged|bent|cracked|dinged)|(?:got|had|received|picked up) (?:\S+ ){0,5}?(?:in the (?:post|mail) (?:today|yesterday|this|finally|from)|back from the (?:galvani[sz]er|galvani[sz]ers|laser|machine shop|foundry|powder coater|plater|platers|heat treat\w*|sharpener|rewinder))|(?:is|are|'s|came|come) back from (?:the )?(?:galvani\w+|laser\w*|machine shop|foundry|powder\w*|plat\w+|heat treat\w*|anodi\w+|grinder'?s?|blaster\w*)`,
    0.7,
  ),
];

/** Right behind a part's name: it has come. */
export const CAME =
  /^(?:(?:has|have|had|'s|'ve|finally|just|all|both|also|actually|even|eventually) )*(?:came|arrived|turned up|showed up|landed|are here|is here|got here|come in|came in|been delivered|got delivered)(?! (?:out|off|from|up|down|with|apart|loose|back|over|round|around|undone|as|at|free|away|to|on|together|first|later|last|before|after|next|along|straight|clean|through|across|through)\b)\b/;
