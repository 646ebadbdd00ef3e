import { expect, test } from 'vitest';
import { explainLog } from '../../../scripts/cluster-log.ts';

const FOLDER = '/srv/diary/postgres';
const LOG = '/srv/diary/postgres.log';

test.each([
  [
    'FATAL:  could not write lock file "postmaster.pid": No space left on device',
    'The disk is full: free some space for /srv/diary/postgres, then start again.',
  ],
  [
    'DETAIL:  The data directory was initialized by PostgreSQL version 14, which is not compatible',
    'The database in /srv/diary/postgres was made by another version of PostgreSQL. Centrepop uses 15: use another DATA_DIR, or move the data with pg_dump.',
  ],
  [
    'FATAL:  could not map anonymous shared memory: Cannot allocate memory',
    'There is not enough memory for PostgreSQL: free some, then start again.',
  ],
  [
    'PANIC:  could not locate a valid checkpoint record',
    'PostgreSQL did not start on /srv/diary/postgres; /srv/diary/postgres.log says why. Put the folder back from a backup, or use another DATA_DIR.',
  ],
])('%s', (log, sentence) => {
  expect(explainLog(log, LOG, FOLDER).message).toBe(sentence);
});
