import { sql } from 'drizzle-orm';
import { beforeAll, describe, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { partVersions } from '../../../src/db/schema/parts.ts';
import { comparePartNumbers } from '../../../src/domain/part-numbers.ts';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { type PartFields, PartInput } from '../../../src/features/parts/part.ts';
import { addPart } from '../../../src/features/parts/server/add-part.ts';
import { changePart } from '../../../src/features/parts/server/change-part.ts';
import { deletePart } from '../../../src/features/parts/server/delete-part.ts';
import { listParts } from '../../../src/features/parts/server/list-parts.ts';
import { restorePart } from '../../../src/features/parts/server/restore-part.ts';
import { saveParts } from '../../../src/features/parts/server/save-parts.ts';
import { Conflict, Invalid, NotFound } from '../../../src/server/errors.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;
let count = 0;

beforeAll(async () => {
  shed = await aWorkshop(services);
});

function fields(given: Record<string, unknown>): PartFields {
  return PartInput.parse({ name: 'a part', ...given });
}

async function aBuild(): Promise<string> {
  count += 1;
  build = `press-${String(count)}`;
  await makeBuild(shed.owner, { name: 'Press', slug: build, about: '', plannedEpisodes: null });
  return build;
}

async function numbers(): Promise<string[]> {
  return (await listParts(shed.owner, { build })).items.map(({ number }) => number);
}

async function refusal(asked: Promise<unknown>): Promise<unknown> {
  return asked.then(
    () => {
      throw new Error('It was not refused.');
    },
    (error: unknown) => error,
  );
}

describe('a part', () => {
  test('is kept as typed, by a moderator too', async () => {
    await aBuild();
    await addPart(shed.moderator, {
      ...fields({ number: ' 118 ', name: 'bearing housing', quantity: '2 needed' }),
      build,
    });
    const { items } = await listParts(shed.owner, { build });
    expect(items).toMatchObject([
      { number: '118', name: 'bearing housing', quantity: 2, kind: 'made', version: 1 },
    ]);
  });

  test('has a number of its own, whatever the case', async () => {
    await aBuild();
    await addPart(shed.owner, { ...fields({ number: 'k03', name: 'key' }), build });
    const error = await refusal(addPart(shed.owner, { ...fields({ number: 'K03' }), build }));
    expect(error).toBeInstanceOf(Invalid);
    expect((error as Invalid).fields['number']).toContain('“key”');
    await addPart(shed.owner, { ...fields({ number: 'A-2' }), build });
    await addPart(shed.owner, { ...fields({ number: 'A2' }), build });
    expect(await numbers()).toHaveLength(3);
  });

  test('keeps what it said before', async () => {
    await aBuild();
    const { id } = await addPart(shed.owner, { ...fields({ number: '1', name: 'rail' }), build });
    await changePart(shed.editor, {
      ...fields({ number: '1', name: 'base rail' }),
      build,
      part: id,
      version: 1,
    });
    const [before] = await services.db
      .select()
      .from(partVersions)
      .where(sql`part_id = ${id}`);
    expect(before).toMatchObject({ version: 1, changedBy: shed.people.editor.id, fields: { name: 'rail' } });
  });

  test('that someone else saved meanwhile is not written over', async () => {
    await aBuild();
    const { id } = await addPart(shed.owner, { ...fields({ number: '1', name: 'rail' }), build });
    const mine = { ...fields({ number: '1', name: 'mine' }), build, part: id, version: 1 };
    await changePart(shed.editor, { ...mine, name: 'theirs' });
    const error = await refusal(changePart(shed.owner, mine));
    expect(error).toBeInstanceOf(Conflict);
    expect((error as Conflict).stored).toMatchObject({ name: 'theirs', version: 2 });
  });

  test('is deleted and brought back, unless its number was given away', async () => {
    await aBuild();
    const { id } = await addPart(shed.owner, { ...fields({ number: '7' }), build });
    const { version } = await deletePart(shed.owner, { build, part: id, version: 1 });
    expect(await numbers()).toEqual([]);
    const again = await restorePart(shed.owner, { build, part: id, version });
    expect(await numbers()).toEqual(['7']);
    const deleted = await deletePart(shed.owner, { build, part: id, version: again.version });
    await addPart(shed.owner, { ...fields({ number: '7', name: 'other' }), build });
    const error = await refusal(restorePart(shed.owner, { build, part: id, version: deleted.version }));
    expect((error as Invalid).fields).toHaveProperty('number');
  });

  test('that a note refers to is not deleted', async () => {
    await aBuild();
    const { id } = await addPart(shed.owner, { ...fields({ number: '7' }), build });
    const [anchor, note] = [newId(), newId()];
    await services.db.execute(sql`with built as (
        insert into anchors (id, workshop_id, build_id, clock, shop_at)
        select ${anchor}, workshop_id, build_id, 'shop', now() from parts where id = ${id} returning workshop_id, build_id
      ), noted as (
        insert into notes (id, workshop_id, build_id, anchor_id, kind, text)
        select ${note}, workshop_id, build_id, ${anchor}, 'step', 'turned' from built returning workshop_id
      ) insert into note_parts (workshop_id, note_id, part_id, position)
        select workshop_id, ${note}, ${id}, 1 from noted`);
    const error = await refusal(deletePart(shed.owner, { build, part: id, version: 1 }));
    expect((error as Invalid).message).toContain('Part 7 stays');
    expect(await numbers()).toEqual(['7']);
  });

  test('of another workshop is not found', async () => {
    await aBuild();
    const { id } = await addPart(shed.owner, { ...fields({ number: '1' }), build });
    expect(await refusal(listParts(shed.outsider, { build }))).toBeInstanceOf(NotFound);
    const here = build;
    const elsewhere = await aBuild();
    build = here;
    for (const verb of [deletePart, restorePart]) {
      expect(await refusal(verb(shed.owner, { build: elsewhere, part: id, version: 1 }))).toBeInstanceOf(
        NotFound,
      );
    }
    const change = { ...fields({ number: '9' }), build: elsewhere, part: id, version: 1 };
    expect(await refusal(changePart(shed.owner, change))).toBeInstanceOf(NotFound);
    const changes = [{ do: 'delete', id, version: 1 } as const];
    expect(await refusal(saveParts(shed.owner, { build: elsewhere, changes }))).toBeInstanceOf(NotFound);
  });
});

describe('several changes at once', () => {
  test('swap numbers', async () => {
    await aBuild();
    const [a, b] = [newId(), newId()];
    const part = (number: string, name: string) => ({ ...PartInput.parse({ number, name }) });
    await saveParts(shed.owner, {
      build,
      changes: [
        { do: 'add', id: a, fields: part('1', 'first') },
        { do: 'add', id: b, fields: part('2', 'second') },
      ],
    });
    await saveParts(shed.owner, {
      build,
      changes: [
        { do: 'change', id: a, version: 1, fields: part('2', 'first') },
        { do: 'change', id: b, version: 1, fields: part('1', 'second') },
      ],
    });
    const { items } = await listParts(shed.owner, { build });
    expect(items.map(({ number, name }) => `${number} ${name}`)).toEqual(['1 second', '2 first']);
  });

  test('are taken all or none', async () => {
    await aBuild();
    await addPart(shed.owner, { ...fields({ number: '2' }), build });
    const error = await refusal(
      saveParts(shed.owner, {
        build,
        changes: [
          { do: 'add', id: newId(), fields: { ...PartInput.parse({ number: '1', name: 'x' }) } },
          { do: 'add', id: newId(), fields: { ...PartInput.parse({ number: '2', name: 'y' }) } },
        ],
      }),
    );
    expect((error as Invalid).fields).toHaveProperty(['changes.1.number']);
    expect(await numbers()).toEqual(['2']);
  });
});

test('the database and the page sort numbers alike', async () => {
  const some = [
    '10',
    '9',
    'A2',
    'a10',
    'A-2',
    'K03',
    'k3',
    '101',
    '101a',
    '101B',
    '1.10',
    '1.9',
    'Ä1',
    'z',
    '0',
    '00',
  ];
  const { rows } = await services.db.execute<{ number: string }>(
    sql`select number from unnest(${sql.param(some)}::text[]) as number order by number collate "part_numbers"`,
  );
  expect(rows.map(({ number }) => number)).toEqual([...some].sort(comparePartNumbers));
});
