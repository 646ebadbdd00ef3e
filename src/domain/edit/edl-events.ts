/** A time of a list as written: a label, or a plain count of frames. */
type WrittenTime = string;

/** One line of an event, with what the lines below it say about it. */
export interface EdlEvent {
  readonly line: number;
  readonly number: string;
  readonly reel: string;
  readonly channels: string;
  /** C a cut, D a dissolve, W001 a wipe, K a key. */
  readonly transition: string;
  /** How long the transition takes, in frames; 0 for a cut. */
  readonly transitionFrames: number;
  readonly source: readonly [WrittenTime, WrittenTime];
  readonly record: readonly [WrittenTime, WrittenTime];
  /** Whether the list says here that its labels drop; null where it says nothing, or each label does. */
  readonly drop: boolean | null;
  from: string | null;
  to: string | null;
  file: string | null;
  /** Frames a second that the clip plays at, as written; null where none is said. */
  speed: { readonly line: number; readonly fps: string } | null;
  readonly markers: EdlMarker[];
}

interface EdlMarker {
  readonly line: number;
  readonly at: WrittenTime;
  readonly colour: string | null;
  readonly name: string;
}

/** A list in pieces, nothing computed. */
export interface EdlEvents {
  readonly title: string;
  readonly events: readonly EdlEvent[];
  readonly unread: readonly { readonly line: number; readonly text: string; readonly event: boolean }[];
  /** Sound tracks named below an event. */
  readonly moreSound: readonly { readonly line: number; readonly text: string }[];
}

const TIME = /^(?:\d{1,2}[:;.]\d{2}[:;.]\d{2}[:;.]\d{2,3}|\d{1,9})$/;
const NOTE = /^\*?\s*(FROM CLIP NAME|TO CLIP NAME|SOURCE FILE)\s*:\s*(.*)$/i;
const MARKER = /^\*\s*LOC\s*:\s*(\S+)(?:\s+(\S+))?(?:\s+(.*))?$/i;
const SPEED = /^M2\s+(.*\S)\s+([+-]?\d+(?:\.\d+)?)\s+(\S+)$/i;
/** Lines that say something about an effect which its event says too. */
const REMARK = /^(?:\*|EFFECTS? NAME|BLEND\b|SPLIT\s*:)/i;

/** An event's line in pieces, read from its end: a reel's name may have spaces in it. */
function readEvent(line: number, text: string, drop: boolean | null): EdlEvent | null {
  const [number = '', ...words] = text.split(/\s+/);
  const times = words.slice(-4);
  const before = words.slice(0, -4);
  if (times.length < 4 || !times.every((word) => TIME.test(word))) return null;
  const last = before.at(-1) ?? '';
  const timed = /^\d{1,4}$/.test(last) && before.length > 2;
  const frames = timed ? Number(before.pop()) : 0;
  const transition = before.pop();
  const channels = before.pop();
  const reel = before.join(' ');
  if (transition === undefined || channels === undefined || reel === '') return null;
  const [sourceIn = '', sourceOut = '', recordIn = '', recordOut = ''] = times;
  return {
    line,
    number,
    reel,
    channels: channels.toUpperCase(),
    transition: transition.toUpperCase(),
    transitionFrames: frames,
    source: [sourceIn, sourceOut],
    record: [recordIn, recordOut],
    // A list that marks labels which drop means by the others that they do not.
    drop: times.some((word) => /[;.]\d+$/.test(word)) ? null : drop,
    from: null,
    to: null,
    file: null,
    speed: null,
    markers: [],
  };
}

function takeNote(event: EdlEvent, name: string, value: string): void {
  if (/^FROM/i.test(name)) event.from ??= value;
  else if (/^TO/i.test(name)) event.to ??= value;
  else event.file ??= value;
}

function takeMarker(event: EdlEvent, line: number, found: RegExpExecArray): void {
  const [, at = '', colour = null, name = ''] = found;
  event.markers.push({ line, at, colour: colour?.toUpperCase() ?? null, name: name.trim() });
}

/** The line of the event, or of the pair of a transition, that a speed is said of. */
function findSpeedOwner(events: readonly EdlEvent[], reel: string, at: string): EdlEvent | null {
  const last = events.at(-1);
  if (last === undefined) return null;
  const pair = events.slice(-2).filter(({ number }) => number === last.number);
  return pair.find((event) => event.reel === reel && event.source[0] === at && event.speed === null) ?? last;
}

/**
 * Takes an edit list apart, line by line. Line ends may be mixed, columns parted by tabs or spaces, and the star
 * before a note left out.
 * Source: the layout of SMPTE 258M lists as the samples of OpenTimelineIO's CMX 3600 adapter show it.
 */
export function readEdlEvents(text: string): EdlEvents {
  let title = '';
  let drop: boolean | null = null;
  const events: EdlEvent[] = [];
  const unread: EdlEvents['unread'][number][] = [];
  const moreSound: EdlEvents['moreSound'][number][] = [];
  for (const [index, raw] of text.split(/\r\n|\r|\n/).entries()) {
    const line = index + 1;
    const own = raw.replaceAll('\0', '').trim();
    const event = events.at(-1);
    if (own === '') continue;
    if (/^\d{1,6}[A-Z]?\s/i.test(own)) {
      const read = readEvent(line, own, drop);
      if (read === null) unread.push({ line, text: own, event: true });
      else events.push(read);
      continue;
    }
    const note = NOTE.exec(own);
    const marker = MARKER.exec(own);
    const speed = SPEED.exec(own);
    if (/^TITLE\s*:/i.test(own)) title = own.replace(/^TITLE\s*:\s*/i, '');
    else if (/^FCM\s*:/i.test(own)) drop = !/NON/i.test(own);
    else if (event !== undefined && note !== null) takeNote(event, note[1] ?? '', (note[2] ?? '').trim());
    else if (event !== undefined && marker !== null) takeMarker(event, line, marker);
    else if (speed !== null) {
      const owner = findSpeedOwner(events, speed[1] ?? '', speed[3] ?? '');
      if (owner === null) unread.push({ line, text: own, event: false });
      else owner.speed = { line, fps: speed[2] ?? '' };
    } else if (/^AUD\s+\d/i.test(own)) moreSound.push({ line, text: own });
    else if (!REMARK.test(own)) unread.push({ line, text: own, event: false });
  }
  return { title, events, unread, moreSound };
}
