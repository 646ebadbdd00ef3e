import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, expect, test } from 'vitest';
import { workStretches } from '../../../src/db/schema/footage.ts';
import { AddStretchInput, StartStretchInput } from '../../../src/features/footage/footage.ts';
import { addStretch } from '../../../src/features/footage/server/add-stretch.ts';
import { deleteStretch } from '../../../src/features/footage/server/delete-stretch.ts';
import { restoreStretch } from '../../../src/features/footage/server/restore-stretch.ts';
import { startStretch } from '../../../src/features/footage/server/start-stretch.ts';
import { stopStretch } from '../../../src/features/footage/server/stop-stretch.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aBuildToFilm } from '../../support/footage.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;
let buildId: string;

beforeAll(async () => {
  shed = await aWorkshop(services);
});
beforeEach(async () => {
  ({ build, buildId } = await aBuildToFilm(shed.owner));
});

const start = (who = shed.owner, given: object = {}) =>
  startStretch(who, { build, ...StartStretchInput.parse(given) });
const write = (given: object = {}, who = shed.owner) =>
  addStretch(who, {
    build,
    ...AddStretchInput.parse({ day: '2026-07-02', from: '9:00', until: '10:30', ...given }),
  });
const stored = () => services.db.select().from(workStretches).where(eq(workStretches.buildId, buildId));

test('a timer runs from its start until it is stopped, one at a time', async () => {
  const { id } = await start();
  await expect(start(shed.editor, { sign: 'mark' })).rejects.toThrow(Invalid);
  expect(await stored()).toMatchObject([{ sign: 'timer', untilAt: null, fromAt: shed.owner.now }]);
  const later = { ...shed.owner, now: new Date(shed.owner.now.getTime() + 60_000) };
  await stopStretch(later, { build, stretch: id, version: 1 });
  expect(await stored()).toMatchObject([{ untilAt: later.now }]);
  await start(shed.editor, { sign: 'mark' });
  expect(await stored()).toHaveLength(2);
});

test('hours are written down by the shop’s clock, past midnight too', async () => {
  await write();
  await write({ from: '22:15', until: '1:00', text: 'Glue-up.' });
  expect(await stored()).toMatchObject([
    { fromAt: new Date('2026-07-02T08:00:00Z'), untilAt: new Date('2026-07-02T09:30:00Z'), sign: 'diary' },
    { fromAt: new Date('2026-07-02T21:15:00Z'), untilAt: new Date('2026-07-03T00:00:00Z') },
  ]);
  await expect(write({ from: '9:00', until: '9:00' })).rejects.toHaveProperty('fields.until');
  await expect(write({ from: '25:00' })).rejects.toHaveProperty('fields.from');
});

test('hours are deleted and brought back, unless someone changed them meanwhile', async () => {
  const { id: stretch } = await write();
  const { version } = await deleteStretch(shed.owner, { build, stretch, version: 1 });
  await expect(stopStretch(shed.owner, { build, stretch, version })).rejects.toThrow(NotFound);
  await expect(restoreStretch(shed.owner, { build, stretch, version: 1 })).rejects.toThrow(Conflict);
  await restoreStretch(shed.owner, { build, stretch, version });
  expect(await stored()).toMatchObject([{ deletedAt: null }]);
});

test('a moderator is refused, and another workshop does not find them', async () => {
  const { id: stretch } = await write();
  const other = await aWorkshop(services);
  for (const [who, error] of [
    [shed.moderator, Forbidden],
    [other.owner, NotFound],
  ] as const) {
    const ref = { build, stretch, version: 1 };
    await expect(start(who)).rejects.toThrow(error);
    await expect(write({}, who)).rejects.toThrow(error);
    for (const verb of [stopStretch, deleteStretch, restoreStretch])
      await expect(verb(who, ref)).rejects.toThrow(error);
  }
  const elsewhere = await aBuildToFilm(other.owner);
  for (const verb of [stopStretch, deleteStretch, restoreStretch])
    await expect(verb(other.owner, { ...elsewhere, stretch, version: 1 })).rejects.toThrow(NotFound);
});
