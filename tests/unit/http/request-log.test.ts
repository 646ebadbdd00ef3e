import { pino } from 'pino';
import { expect, test } from 'vitest';
import { paths } from '../../../src/paths.ts';
import { signToken } from '../../../src/server/auth/signed-token.ts';
import { logRequest } from '../../../src/server/http/request-log.ts';

test('a token in a path is not logged: whoever reads the log could use it', () => {
  const lines: string[] = [];
  const id = '01890000-0000-7000-8000-000000000000';
  const token = signToken('a secret', 'leave', id);
  logRequest(pino({}, { write: (line: string) => void lines.push(line) }), {
    requestId: 'r',
    method: 'POST',
    path: paths.api.leave(id, token),
    status: 200,
    startedAt: performance.now(),
    cache: 'none',
  });
  expect(lines.join('')).toContain(`"/api/subscriptions/${id}/leave/…"`);
});
