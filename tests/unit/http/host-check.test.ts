import { expect, test } from 'vitest';
import { hostChecker } from '../../../src/server/http/host-check.ts';

test.each([
  ['https://shop.example', 'shop.example', 'ours'],
  ['https://shop.example', 'SHOP.example:443', 'ours'],
  ['https://shop.example', 'shop.example:80', 'not ours'],
  ['https://shop.example', 'localhost', 'not ours'],
  ['https://shop.example', 'shop.example.evil.example', 'not ours'],
  ['https://shop.example', 'user@shop.example', 'not ours'],
  ['https://shop.example', undefined, 'not ours'],
  ['http://127.0.0.1:4321', '127.0.0.1:4321', 'ours'],
  ['http://127.0.0.1:4321', 'localhost:4321', 'another loopback name'],
  ['http://127.0.0.1:4321', '[::1]:4321', 'another loopback name'],
  ['http://127.0.0.1:4321', 'localhost:4322', 'not ours'],
  ['http://127.0.0.1:4321', '192.168.1.4:4321', 'not ours'],
])('with PUBLIC_URL %s, host %s is %s', (publicUrl, host, verdict) => {
  expect(hostChecker(new URL(publicUrl))(host)).toBe(verdict);
});
