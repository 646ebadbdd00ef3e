import { saying } from './remark.ts';

const PLAN = String.raw`(?:the |my |our |these |those |that )?(?:original |printed )?(?:drawings?|plans?|print|prints|blueprints?|sketch|layout|schematic|template|cad|spec|specs|design|instructions|cut list|cutlist)(?:'s)?`;
const WORKED = String.raw`(?:used|using|use|gone|going|went|go|made|making|make|put|putting|fitted|fitting|fit|chose|chosen|cut|cutting|welded|welding|bolted|bolting|did|doing|do|done|screwed|glued|bought|turned|built|ended up|settled)`;
const INSTEAD = String.raw`(?:but|and i'm|and i've|and i am|so i|so i've|i've (?:gone|used|made|put|cut|got|done|decided|turned|moved)|instead|however|i'm (?:using|going|putting|making|doing|fitting|calling|having)|i went|i used|i made|i put|i cut|we went|we're|we used|only i|except|which is (?:wrong|daft|stupid|nonsense|optimistic|silly|mad)|and that's (?:wrong|not|never)|nope|no chance|no thanks)`;
const NOT_WORK =
  /\b(?:going|meant|supposed|gonna|planning|hoping) to (?:say|tell|show you|mention|ask|film|sleep|have|start (?:this|by)|be here|do this (?:yesterday|last)|rain|call|go (?:home|to)|talk|sing|complain|apologi[sz]e|make a joke|eat|stop|bed)\b/;

/** Ways in which makers say that the work differs from the plan. */
export const CHANGES = [
  saying(
    'the plan says, but',
    `${PLAN} (?:(?:clearly|actually|only|just|originally|also) )?(?:says?|said|calls? for|called for|shows?|showed|has|had|got|only|wants?|wanted|asks? for|asked for|specifies|specified|gives|is for|was for|reckons?|would have|draws|has it|have it|have|want|call)(?: \\S+){0,18}? ${INSTEAD}`,
    0.85,
    /\b(?:sticking (?:to|with)|as per|followed|exactly what|same as|matches)\b/,
  ),
  saying(
    'not on the plan',
    `(?:not|isn't|aren't|wasn't|weren't|never|nowhere|nothing|ain't) (?:\\S+ ){0,3}?(?:on|in|to|per|from) (?:${PLAN}|the (?:parts )?list|my list)`,
    0.8,
    /\b(?:not (?:yet )?(?:up )?to (?:the )?(?:bottom|end) of the list|only one not)\b/,
  ),
  saying(
    'not what the plan says',
    `(?:not|isn't|aren't|wasn't) (?:\\S+ ){0,2}?(?:what|how|where|like|as) (?:${PLAN}|i (?:drew|planned|had drawn)|it's drawn|it was drawn)`,
    0.85,
  ),
  saying(
    'will not be found on the plan',
    `(?:won't|don't|can't|will not) (?:find|see) (?:\\S+ ){0,4}?(?:on|in) (?:${PLAN}|the (?:parts )?list)`,
    0.8,
  ),
  saying(
    'the one on the plan',
    `(?:on|in) ${PLAN} (?:had|were (?:all|too|never)|didn't|doesn't|don't|won't|wouldn't|isn't|aren't|couldn't|can't|was (?:too|going|meant|supposed|never)|is (?:wrong|too|out)|are (?:wrong|too|out))`,
    0.75,
  ),
  saying(
    'was going to, but',
    `(?:was|were|had been|wanted|meant) (?:gonna|to|(?:going|meant|supposed|planning|hoping|intending) to) (?:\\S+ ){0,20}?(?:but|instead|until|so now|and then i)`,
    0.7,
    NOT_WORK,
  ),
  saying(
    'was going to be',
    `(?:was|were) (?:gonna|(?:going|meant|supposed) to) be (?:\\S+ ){0,12}?(?:it's now|they're now|now it's|now they're|is now|are now|and now|i've)`,
    0.75,
  ),
  saying(
    'the plan was',
    `(?:plan|idea|intention) (?:was|had been) (?:\\S+ ){0,16}?(?:but|instead|until|and then|so)`,
    0.7,
    NOT_WORK,
  ),
  saying(
    'so much for the plan',
    String.raw`so much for (?:the|that|my) (?:plan|plans|drawing)|(?:that's|there goes) (?:the|that|my) (?:plan|drawing) (?:out|gone)|(?:off|gone off|away from|departed from|departing from|straying from|strayed from|deviat\w+ from) (?:the )?(?:plans?|drawings?|script|piste|print)`,
    0.8,
  ),
  saying(
    'the plan is wrong',
    `(?:${PLAN}(?: is| are)? (?:wrong|out here|lying|lies|lied|off by|out by)|(?:ignore|ignoring|ignored|forget|scrap|scrapped) (?:what )?(?:the|those|that) (?:drawings?|plans?|print)|(?:doesn't|don't|didn't|does not) (?:match|agree with|follow) ${PLAN}|(?:mistake|error|typo) (?:on|in) ${PLAN})`,
    0.8,
  ),
  saying(
    'other than planned',
    `(?:longer|shorter|wider|narrower|thicker|thinner|bigger|smaller|deeper|heavier|lighter|taller|higher|lower|closer|further|more|fewer|less|different|differently|differs?|change|changed|changes|departure|changing|altered|moved) (?:\\S+ ){0,5}?(?:than|from|to|on|compared to) (?:${PLAN}|drawn|planned|i drew|i'd drawn|what i drew|what's drawn|what's on ${PLAN}|it says)`,
    0.85,
  ),
  saying(
    'rather than planned',
    `rather than (?:\\S+ ){0,6}?(?:${PLAN}|drawn|planned|shown)|where ${PLAN} (?:says|has|shows|puts|wants|had)`,
    0.75,
  ),
  saying(
    'instead of',
    `${WORKED} (?:\\S+ ){0,10}?instead of (?!that |just |me |going |having to |waiting |it being |complaining )`,
    0.65,
    /\b(?:normal people|like (?:a|an) (?:normal|adult|sane)|sleeping|the gym|therapy)\b/,
  ),
  saying(
    'instead',
    `(?:i've|i'm|i'll|so i|we've|we're|i|it's|they're|so it's|so they're) (?:\\S+ ){0,3}?${WORKED} (?:\\S+ ){0,8}?instead(?! of)`,
    0.65,
  ),
  saying(
    'figure on the plan, but',
    `(?:says?|said|shows?|it's|was|were|is|are) (?:\\S+ ){1,6}?(?:on|in) ${PLAN} (?:\\S+ ){0,3}?(?:but|i've|so i|and i)`,
    0.7,
  ),
  saying('got more', String.raw`got (?:bumped|upped|upgraded|beefed up|upsized) (?:up )?to`, 0.6),
  saying(
    'changed',
    String.raw`(?:i've|i have|we've|i) (?:had to change|changed|altered|modified|redesigned|redrawn|redrew|swapped|moved|upgraded|beefed up|upsized|downsized) (?:the|this|that|it|these|those|my|how|where|from|them|my mind)`,
    0.7,
    /\b(?:changed (?:the|my) (?:disc|blade|bit|wheel|battery|gas|tip|oil|shirt|camera|angle|music|subject|shoes|clothes)|swapped (?:over )?to|(?:changed|moved) (?:the )?camera|moved (?:it|this|that|the \S+) (?:over|across|out|back|into|outside|to the bench))\b/,
  ),
  saying(
    'swapped for',
    `(?:swapped|swapping|replaced|replacing|substituted|substituting) (?:\\S+ ){0,6}?(?:for|with) (?:a|an|the|some|two|one|\\S+)`,
    0.6,
    /\b(?:blade|disc|battery|tip|bit|camera|coffee|tea|belt on the|sandpaper)\b/,
  ),
  saying(
    'added',
    `(?:added|adding|add|put in|putting in|put on|fitted|welded in|throwing in|thrown in|there's|with|given it|having|have) (?:an|one|two|three|a couple of|some|another)? ?extra \\S+(?! (?:bit|time|minute|minutes|day|hour|coat|pair of hands|care|careful|credit|cheese))`,
    0.6,
    /\bextra (?:bit|time|minute|minutes|day|hour|coat|coats|pair of hands|care|careful|credit|cheese|shot|footage|day's|money)\b/,
  ),
  saying(
    'left out',
    String.raw`(?:i'm|i've|we're|i) (?:leaving out|left out|skipping|skipped|dropping|dropped|ditching|ditched|doing without|not bothering with|losing) (?:the|that|those|one of the|both)`,
    0.55,
    /\b(?:dropped (?:the|that) (?:caliper|phone|hammer|spanner|it|screw|nut|bolt)|skipp\w+ (?:the )?(?:boring|next|video|lunch|rest))\b/,
  ),
  saying(
    'could not be had',
    `(?:couldn't|could not|can't|wasn't able to|wouldn't) (?:get|find|buy|source|sell me) (?:\\S+ ){0,10}?(?:so|but|instead)`,
    0.6,
    /\b(?:find (?:my|the) (?:pencil|tape|square|keys|phone|glasses)|get (?:it|that) (?:out|off|apart|undone|loose|in focus|to work))\b/,
  ),
  saying(
    'what there was',
    String.raw`(?:but|because) (?:this|that|these|it|they)(?:'s| was| is| were| are)? (?:what i had|what they had|all (?:i|they) had|all i could get|in the rack|in the scrap|in the pile|lying around|what was (?:in|on|left))|was all (?:i|they) had|is all (?:i|they) had|only had (?:\S+ ){1,8}?(?:so|instead)`,
    0.7,
  ),
  saying(
    'originally',
    `(?:originally|initially|at first|on paper|to begin with) (?:\\S+ ){0,14}?(?:but|now|instead)`,
    0.6,
    /\b(?:thought|bought|from|i was (?:scared|confused))\b/,
  ),
] as const;
