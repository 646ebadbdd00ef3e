import { expect, test } from 'vitest';
import { addressKey } from '../../../src/server/limits/rate-limiter.ts';

test.each([
  ['192.0.2.7', '192.0.2.7'],
  ['::ffff:192.0.2.7', '192.0.2.7'],
  ['::FFFF:192.0.2.7', '192.0.2.7'],
  ['2001:db8:1:2:3:4:5:6', '2001:0db8:0001:0002::/64'],
  ['2001:DB8:1:2::9', '2001:0db8:0001:0002::/64'],
  ['2001:db8::9', '2001:0db8:0000:0000::/64'],
  ['::1', '0000:0000:0000:0000::/64'],
  ['::', '0000:0000:0000:0000::/64'],
  ['fe80::1%eth0', 'fe80:0000:0000:0000::/64'],
  ['1:2:3:4:5:6:7::', '0001:0002:0003:0004::/64'],
  ['64:ff9b::192.0.2.7', '0064:ff9b:0000:0000::/64'],
  ['', ''],
])('%s counts as %s', (address, key) => {
  expect(addressKey(address)).toBe(key);
});

test('neighbours in one /64 count together, those in the next do not', () => {
  expect(addressKey('2001:db8:0:5::1')).toBe(addressKey('2001:db8:0:5:ffff:ffff:ffff:ffff'));
  expect(addressKey('2001:db8:0:5::1')).not.toBe(addressKey('2001:db8:0:6::1'));
});
