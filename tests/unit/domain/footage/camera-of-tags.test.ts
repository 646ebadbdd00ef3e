import { expect, test } from 'vitest';
import { cameraOfTags } from '../../../../src/domain/footage/camera-of-tags.ts';

test.each([
  [{ make: 'Marram', model: 'Shed One' }, 'Marram Shed One'],
  [{ make: 'Marram', model: 'MARRAM Shed One' }, 'MARRAM Shed One'],
  [{ 'com.apple.quicktime.make': 'Tarn', 'com.apple.quicktime.model': 'Two', make: 'Other' }, 'Tarn Two'],
  [{ 'com.android.manufacturer': 'Tarn', 'com.android.model': 'T3' }, 'Tarn T3'],
  [{ model: '  Shed\u0000\n One ' }, 'Shed One'],
  [{ make: 'Marram' }, 'Marram'],
  [{ make: 'M'.repeat(200) }, 'M'.repeat(80)],
])('%j name the camera %s', (tags: Record<string, string>, name) => {
  expect(cameraOfTags(tags)).toBe(name);
});

test('tags that name no camera give none', () => {
  expect(cameraOfTags({ title: 'Day one', make: ' ' })).toBeNull();
});
