/**
 * The open player.js message specification: a page and the player in its frame send each other JSON texts by
 * postMessage, each with this context and a version. Names of methods and events are the specification's.
 */
const CONTEXT = 'player.js';
const VERSION = '0.0.11';

/** The longest message that is looked at, in characters. Our own limit. */
const MESSAGE_LENGTH = 4096;

export type PlayerMethod =
  | 'play'
  | 'pause'
  | 'getDuration'
  | 'getCurrentTime'
  | 'setCurrentTime'
  | 'addEventListener'
  | 'removeEventListener';

/** What the frame tells, as far as the page needs it. Times are seconds. */
export type PlayerEvent =
  | { readonly event: 'ready' }
  | { readonly event: 'play' }
  | { readonly event: 'pause' }
  | { readonly event: 'ended' }
  | { readonly event: 'timeupdate'; readonly seconds: number; readonly duration: number | null }
  /** The answer to getDuration or getCurrentTime, under the listener's name that was sent with it. */
  | { readonly event: 'answer'; readonly listener: string; readonly value: number };

/**
 * A message to the frame, as text. It is sent to the video's origin, never to '*'.
 * @param value seconds for setCurrentTime; the event's name for the listeners
 * @param listener the name under which a getter answers
 */
export function writePlayerMessage(method: PlayerMethod, value?: number | string, listener?: string): string {
  return JSON.stringify({
    context: CONTEXT,
    version: VERSION,
    method,
    ...(value === undefined ? {} : { value }),
    ...(listener === undefined ? {} : { listener }),
  });
}

/**
 * What a message from the frame says; null for anything else. Whoever calls has compared the sender's origin
 * and window with the frame's first.
 */
export function readPlayerMessage(data: unknown): PlayerEvent | null {
  const message = parse(data);
  if (message?.['context'] !== CONTEXT) return null;
  const { event, value, listener } = message;
  if (event === 'ready' || event === 'play' || event === 'pause' || event === 'ended') return { event };
  if (event === 'timeupdate') return readTime(value);
  if ((event === 'getDuration' || event === 'getCurrentTime') && isTime(value))
    return { event: 'answer', listener: typeof listener === 'string' ? listener : event, value };
  return null;
}

/** Some players send the object itself where the specification has its text. */
function parse(data: unknown): Readonly<Record<string, unknown>> | null {
  if (typeof data !== 'string') return isRecord(data) ? data : null;
  if (data.length > MESSAGE_LENGTH) return null;
  try {
    const parsed: unknown = JSON.parse(data);
    return isRecord(parsed) ? parsed : null;
  } catch {
    return null;
  }
}

function readTime(value: unknown): PlayerEvent | null {
  if (!isRecord(value) || !isTime(value['seconds'])) return null;
  const duration = value['duration'];
  return { event: 'timeupdate', seconds: value['seconds'], duration: isTime(duration) ? duration : null };
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function isTime(value: unknown): value is number {
  return typeof value === 'number' && Number.isFinite(value) && value >= 0;
}
