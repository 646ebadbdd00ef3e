import { describe, expect, test } from 'vitest';
import { digitOf } from '../../../src/client/note-keys.ts';
import { commandOf } from '../../../src/features/episodes/components/desk/desk-keys.ts';

const press = (
  key: string,
  held: Partial<Record<'ctrlKey' | 'shiftKey' | 'altKey' | 'metaKey', boolean>> = {},
) => ({ key, ctrlKey: false, metaKey: false, shiftKey: false, altKey: false, ...held });

describe('a key', () => {
  test.each([
    ['n', { do: 'note' }],
    ['N', { do: 'note' }],
    ['2', { do: 'kind', kind: 'size' }],
    ['0', { do: 'kind', kind: 'tip' }],
    [',', { do: 'step', by: -1, size: 'frame' }],
    ['ArrowRight', { do: 'step', by: 1, size: 'second' }],
    ['?', { do: 'keys' }],
    ['q', null],
  ])('%s', (key, command) => {
    expect(commandOf(press(key))).toEqual(command);
  });

  test('with Ctrl undoes, with Shift too does again', () => {
    expect(commandOf(press('z', { ctrlKey: true }))).toEqual({ do: 'undo' });
    expect(commandOf(press('Z', { ctrlKey: true, shiftKey: true }))).toEqual({ do: 'redo' });
    expect(commandOf(press('n', { ctrlKey: true }))).toBeNull();
  });

  test('without Ctrl does nothing when single keys are switched off', () => {
    expect(commandOf(press('n'), false)).toBeNull();
    expect(commandOf(press('z', { ctrlKey: true }), false)).toEqual({ do: 'undo' });
  });

  test('with Alt belongs to the browser', () => {
    expect(commandOf(press('ArrowLeft', { altKey: true }))).toBeNull();
  });

  test('is a digit of its own for every kind', () => {
    expect(digitOf('step')).toBe('1');
    expect(digitOf('tip')).toBe('0');
  });
});
