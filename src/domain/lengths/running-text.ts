/** Words after “3 in” that make it inches; before any other word it is more often the preposition. */
const AFTER_WHOLE_INCHES =
  /^(?:wide|long|thick|deep|high|tall|diameter|dia|od|id|bore|radius|square|round|flat|bars?|plate|sheet|angle|channel|tub(?:e|ing)|pipe|box|x|by|to|from|off|of|over|under|apart|and|or|per|below|above|across|bolts?|screws?|holes?|shaft|centres?|centers?|max|min|maximum|minimum|longer|shorter|wider|thicker|more|less|between|stock)\b/i;

/** Words after “1/2 in” that make even a fraction the preposition’s. */
const AFTER_PREPOSITION =
  /^(?:the|an?|this|that|these|those|my|your|his|her|our|their|its|it|place|revision|episode|part|stage|chapter|line|total)\b/i;

/**
 * Whether “in” after a number means inches.
 * @param rest of the text behind it
 * @param whole whether the number is a whole one, such as a part number would be
 */
export function readsAsInches(rest: string, whole: boolean): boolean {
  const [, word] = /^[ \u00a0]+([\p{L}\p{N}].*)/su.exec(rest) ?? [];
  if (word === undefined) return true;
  return whole ? AFTER_WHOLE_INCHES.test(word) : !AFTER_PREPOSITION.test(word);
}

/** Whether a number can begin here: not within a word, another number, a money amount or a name such as A-40. */
export function startsNumber(text: string, at: number): boolean {
  const before = text.slice(Math.max(0, at - 2), at);
  const last = before.at(-1) ?? '';
  if (/[Øø⌀]/u.test(last)) return true;
  // The last stop of an ellipsis is no decimal point.
  if (last === '.' && text.charAt(at) === '.') return false;
  if (/[\p{L}\p{N}_#$€£¥\\½¼¾⅛⅜⅝⅞]/u.test(last)) return false;
  // After a comma, slash, hyphen or stop only where that ends no number and no word: “…, 40 mm” but not “1,500”.
  return !/[\p{L}\p{N}][,/:'-]$|[^.]\.$|^\.$/u.test(before);
}

/**
 * Whether a quotation is open just before a place, so that a mark there closes it and is no inch or foot.
 * @param mark " or '
 */
export function isOpenQuote(text: string, at: number, mark: string): boolean {
  let open = false;
  for (let index = 0; index < at; index += 1) {
    if (text.charAt(index) !== mark) continue;
    const [before, after] = [text.charAt(index - 1), text.charAt(index + 1)];
    if (open) open = false;
    else open = /^[\s([{]?$/.test(before) && /^\S$/.test(after);
  }
  return open;
}
