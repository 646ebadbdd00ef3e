import { IncomingMessage } from 'node:http';
import { Socket } from 'node:net';
import { expect, test } from 'vitest';
import { clientAddressFinder, overwriteForwardedHeaders } from '../../../src/server/http/client-address.ts';

function requestFrom(peer: string, headers: Record<string, string> = {}): IncomingMessage {
  const socket = new Socket();
  Object.defineProperty(socket, 'remoteAddress', { value: peer });
  const req = new IncomingMessage(socket);
  req.headers = { ...headers };
  return req;
}

test.each([
  { trusted: [], peer: '198.51.100.7', forwarded: '203.0.113.9', expected: '198.51.100.7' },
  { trusted: ['198.51.100.7'], peer: '198.51.100.7', forwarded: '203.0.113.9', expected: '203.0.113.9' },
  { trusted: ['198.51.100.7'], peer: '198.51.100.8', forwarded: '203.0.113.9', expected: '198.51.100.8' },
  {
    trusted: ['198.51.100.0/24'],
    peer: '198.51.100.7',
    forwarded: '1.1.1.1, 203.0.113.9, 198.51.100.9',
    expected: '203.0.113.9',
  },
  { trusted: ['10.0.0.1'], peer: '::ffff:10.0.0.1', forwarded: '203.0.113.9:4711', expected: '203.0.113.9' },
  { trusted: ['10.0.0.1'], peer: '10.0.0.1', forwarded: '[2001:db8::1]:443', expected: '2001:db8::1' },
  { trusted: ['10.0.0.1'], peer: '10.0.0.1', forwarded: 'unknown', expected: '10.0.0.1' },
])('trusting $trusted, $peer saying $forwarded is $expected', ({ trusted, peer, forwarded, expected }) => {
  expect(clientAddressFinder(trusted)(requestFrom(peer, { 'x-forwarded-for': forwarded }))).toBe(expected);
});

test('a proxy that is no address is refused', () => {
  expect(() => clientAddressFinder(['the-proxy'])).toThrow(TypeError);
});

test('what a client says about itself is replaced', () => {
  const req = requestFrom('198.51.100.7', {
    host: 'evil.example',
    forwarded: 'for=1.1.1.1',
    'x-forwarded-for': '1.1.1.1',
    'x-forwarded-port': '1',
    'x-real-ip': '1.1.1.1',
    'x-original-url': '/admin',
    accept: '*/*',
  });
  overwriteForwardedHeaders(req, '198.51.100.7', new URL('https://shop.example'));
  expect(req.headers).toEqual({
    host: 'shop.example',
    'x-forwarded-for': '198.51.100.7',
    'x-forwarded-host': 'shop.example',
    'x-forwarded-proto': 'https',
    accept: '*/*',
  });
});
