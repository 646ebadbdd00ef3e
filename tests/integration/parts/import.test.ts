import { beforeAll, describe, expect, test } from 'vitest';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { type ImportList, ImportListInput } from '../../../src/features/parts/import-list.ts';
import { exportParts } from '../../../src/features/parts/server/export-parts.ts';
import { importParts } from '../../../src/features/parts/server/import-parts.ts';
import { listParts } from '../../../src/features/parts/server/list-parts.ts';
import { POST } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/parts/import.ts';
import { Invalid, NotFound } from '../../../src/server/errors.ts';
import { UploadedFile } from '../../../src/server/http/uploaded-file.ts';
import { callRoute } from '../../support/call-route.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;
let count = 0;

beforeAll(async () => {
  shed = await aWorkshop(services);
});

async function aBuild(): Promise<void> {
  count += 1;
  build = `press-${String(count)}`;
  await makeBuild(shed.owner, { name: 'Press', slug: build, about: '', plannedEpisodes: null });
}

function list(given: Record<string, unknown>): ImportList & { build: string } {
  return { ...ImportListInput.parse({ 'column-number': '0', 'column-name': '1', ...given }), build };
}
const file = (bytes: Uint8Array | string) => new UploadedFile('parts.csv', Buffer.from(bytes));
const numbers = async () => (await listParts(shed.owner, { build })).items.map(({ number }) => number);

describe('a list of parts', () => {
  test('is read, looked over and taken', async () => {
    await aBuild();
    const read = await importParts(
      shed.moderator,
      list({ file: file('number,name,aliases\n115,stator comb,comb\n116,comb adjuster,\n') }),
    );
    expect(read.view).toMatchObject({
      encoding: 'UTF-8',
      columns: { number: 0, name: 1, aliases: 2 },
      rows: null,
    });
    const text = read.view.text;
    const looked = await importParts(shed.owner, list({ step: 'look', text, 'column-aliases': '2' }));
    expect(looked).toMatchObject({ taken: null, view: { adds: 2, problems: 0 } });
    expect(await numbers()).toEqual([]);
    const taken = await importParts(shed.owner, list({ step: 'take', text, 'column-aliases': '2' }));
    expect(taken.taken).toEqual({ added: 2, updated: 0 });
    expect(await numbers()).toEqual(['115', '116']);
  });

  test('with a problem is not taken at all', async () => {
    await aBuild();
    const text = '1,rail\n2,\n1,again\n';
    const { taken, view } = await importParts(shed.owner, list({ step: 'take', text }));
    expect(taken).toBeNull();
    expect(view.problems).toBe(3);
    expect(await numbers()).toEqual([]);
  });

  test('without the columns for number or name says so there', async () => {
    await aBuild();
    const { view } = await importParts(shed.owner, list({ step: 'look', text: 'a,b\n', 'column-name': '' }));
    expect(view.columnErrors).toHaveProperty('name');
    const same = await importParts(shed.owner, list({ step: 'take', text: 'a,b\n', 'column-name': '0' }));
    expect(same.view.columnErrors).toHaveProperty('name');
    expect(same.taken).toBeNull();
  });

  test.each([
    ['an empty file', '', 'empty'],
    ['only a head', 'number,name\n', 'only its head'],
    ['a file that is cut off', 'number,name\n1,"ra', 'breaks off'],
    ['a picture', Uint8Array.from([0x89, 0x50, 0x4e, 0x47, 0, 0, 0, 1]), 'not a text file'],
    [
      '50,000 rows',
      `number,name\n${Array.from({ length: 50_000 }, (_, at) => `${String(at)},part`).join('\n')}`,
      '50,000 rows',
    ],
    ['3 MiB', `number,name\n1,${'x'.repeat(3 * 1024 * 1024)}`, '3.0 MiB'],
  ])('that is %s is answered with a sentence', async (_what, bytes, sentence) => {
    await aBuild();
    const asked = importParts(shed.owner, list({ file: file(bytes) }));
    await expect(asked).rejects.toThrow(Invalid);
    await expect(asked).rejects.toHaveProperty('fields.file', expect.stringContaining(sentence));
  });

  test('may have 5,000 rows', async () => {
    await aBuild();
    const text = Array.from({ length: 5000 }, (_, at) => `${String(at)},part`).join('\n');
    const { taken } = await importParts(shed.owner, list({ step: 'take', text, headed: 'no' }));
    expect(taken).toEqual({ added: 5000, updated: 0 });
    const more = importParts(shed.owner, list({ step: 'take', text: 'A,one more', headed: 'no' }));
    await expect(more).rejects.toThrow(Invalid);
  });

  test('is read back as it was exported, updates included', async () => {
    await aBuild();
    await importParts(shed.owner, list({ step: 'take', text: "1,=rail\n2,'-post\n", headed: 'no' }));
    const { text } = await exportParts(shed.owner, { build });
    expect(text).toContain("1,'=rail");
    const again = await importParts(shed.owner, list({ file: file(text) }));
    expect(again.view.columns).toMatchObject({ number: 0, name: 1, kind: 2, quantity: 3, inPlans: 7 });
    const same = await importParts(
      shed.owner,
      list({ step: 'look', text: again.view.text, existing: 'update' }),
    );
    expect(same.view.rows?.map(({ outcome }) => outcome)).toEqual(['same', 'same']);
  });

  test('of another workshop’s build is not found', async () => {
    await aBuild();
    await expect(importParts(shed.outsider, list({ step: 'take', text: '1,x' }))).rejects.toThrow(NotFound);
  });
});

test('a plain form that fails keeps what was pasted', async () => {
  await aBuild();
  const answer = await callRoute(services, POST, {
    params: { workshop: shed.slug, build },
    actor: shed.people.editor,
    form: { step: 'read', text: 'number,name\n1,"open' },
  });
  expect(answer.status).toBe(422);
  expect(answer.page?.form).toMatchObject({
    values: { text: 'number,name\n1,"open' },
    errors: { text: expect.stringContaining('breaks off') },
  });
});
