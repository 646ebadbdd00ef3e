import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  readPlayerMessage,
  writePlayerMessage,
} from '../../../../src/domain/video-addresses/player-message.ts';

// The open player.js specification, from memory: context, version, event or method, value, listener.
const say = (fields: object) => JSON.stringify({ context: 'player.js', version: '0.0.11', ...fields });

describe('writePlayerMessage', () => {
  it('asks for a second', () => {
    expect(JSON.parse(writePlayerMessage('setCurrentTime', 221.5))).toEqual({
      context: 'player.js',
      version: '0.0.11',
      method: 'setCurrentTime',
      value: 221.5,
    });
  });

  it('names the event and the listener', () => {
    expect(JSON.parse(writePlayerMessage('addEventListener', 'timeupdate', 'page'))).toMatchObject({
      method: 'addEventListener',
      value: 'timeupdate',
      listener: 'page',
    });
  });
});

describe('readPlayerMessage', () => {
  it.each<[string, unknown, unknown]>([
    ['ready', say({ event: 'ready', value: { src: 'https://video.example/w' } }), { event: 'ready' }],
    [
      'a time',
      say({ event: 'timeupdate', value: { seconds: 3.5, duration: 848 } }),
      { event: 'timeupdate', seconds: 3.5, duration: 848 },
    ],
    [
      'a time without a length',
      say({ event: 'timeupdate', value: { seconds: 3.5 } }),
      { event: 'timeupdate', seconds: 3.5, duration: null },
    ],
    [
      'a length',
      say({ event: 'getDuration', value: 848, listener: 'x' }),
      { event: 'answer', listener: 'x', value: 848 },
    ],
    ['an object instead of its text', { context: 'player.js', event: 'play' }, { event: 'play' }],
  ])('understands %s', (_name, data, event) => {
    expect(readPlayerMessage(data)).toEqual(event);
  });

  it.each<[string, unknown]>([
    ['another context', JSON.stringify({ context: 'other', event: 'ready' })],
    ['no JSON', '{'],
    ['an array', '[]'],
    ['a time that is none', say({ event: 'timeupdate', value: { seconds: 'soon' } })],
    ['a time before the start', say({ event: 'timeupdate', value: { seconds: -1 } })],
    ['an event of no use', say({ event: 'progress', value: { percent: 0.3 } })],
    ['a book', say({ event: 'ready', value: 'a'.repeat(5000) })],
  ])('ignores %s', (_name, data) => {
    expect(readPlayerMessage(data)).toBeNull();
  });

  it('never throws, whatever comes', () => {
    fc.assert(
      fc.property(fc.anything(), fc.json(), (data, text) => {
        expect(() => [readPlayerMessage(data), readPlayerMessage(text)]).not.toThrow();
      }),
    );
  });
});
