import { expect, test } from 'vitest';
import { type z } from 'zod';
import { BAD_BODIES, BAD_VALUES } from '../support/bad-input/bad-values.ts';
import { usualValue } from '../support/bad-input/usual-values.ts';
import { exportedFunctions, isRoute, paramsOf, sourceFiles } from '../support/authorisation/find-ruled.ts';
import { callRoute, fieldsOf, type RouteAnswer, type RouteCall } from '../support/call-route.ts';
import { aShownBuild, aShownEpisode, BUILD, noteAt } from '../support/companion.ts';
import { aCamera, aClip } from '../support/footage.ts';
import { aWorkshop, PASSWORD } from '../support/people.ts';
import { ask } from '../support/questions.ts';
import { storageServices } from '../support/storage.ts';
import { type RuledRoute } from '../../src/server/http/api-route.ts';
import { addStage } from '../../src/features/builds/server/add-stage.ts';
import { addSlate } from '../../src/features/footage/server/add-slate.ts';
import { startStretch } from '../../src/features/footage/server/start-stretch.ts';
import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';

/** What nobody should be shown: words of programs instead of a sentence. */
const PROGRAM_WORDS =
  /\b(undefined|null|NaN|Error|expected|received|invalid_|zod|constraint|syntax)\b|\[object/;

/** Refused in the same words at every field, before anything else is looked at. */
const UNKEPT = ['a NUL', 'half a character'];

const services = await storageServices();
await services.storage.prepare();
// What is slow by design would be done hundreds of times here.
const { password } = await services.auth.$context;
password.hash = (text) => Promise.resolve(text);
password.verify = ({ password: text }) => Promise.resolve(text === PASSWORD);

const { slug, people, owner } = await aWorkshop(services);
const parts = await aShownBuild(owner);
const video = { address: 'https://video.example/watch/1', length: '1:00' };
await aShownEpisode(owner, parts, video);
const { id: episode } = await makeEpisode(owner, { build: BUILD, title: 'A draft' });
const { id: stage } = await addStage(owner, { build: BUILD, name: 'Frame', about: '' });
const clip = await aClip(owner, BUILD);
const read = { frame: 0, moment: '', shows: '', shopMs: 1, readBy: 'hand' } as const;
/** What is there, by its name in paths; anything else is an id of nothing. */
const THERE: Readonly<Record<string, string>> = {
  workshop: slug,
  build: BUILD,
  episode,
  stage,
  clip,
  camera: await aCamera(owner, BUILD),
  slate: (await addSlate(owner, { build: BUILD, clip, ...read })).id,
  stretch: (await startStretch(owner, { build: BUILD, sign: 'timer', stage: null, text: '' })).id,
  question: await ask(owner, { text: 'Which grease is on it?' }),
  part: parts.get('117') ?? '',
  note: await noteAt(owner, episode, 1, { text: 'The shaft.', audience: 'team' }),
};

const files = sourceFiles('src/pages/api', /\.ts$/);
const routes = (await exportedFunctions(files)).filter(isRoute);
const doors = routes.map(
  (found) => [`${found.name} ${found.file.replace(/^src\/pages|(\/index)?\.ts$/g, '')}`, found] as const,
);

class Undo extends Error {}

/** Calls a route as the owner, and undoes whatever it has written to our tables. */
async function call(route: RuledRoute, file: string, request: RouteCall): Promise<RouteAnswer> {
  const params = { ...paramsOf(file), ...THERE };
  let answer: RouteAnswer | undefined;
  await services.db
    .transaction(async (db) => {
      const inside = { ...services, db, limiter: { count: () => Promise.resolve() } } as typeof services;
      answer = await callRoute(inside, route, { params, actor: people.owner, ...request });
      throw new Undo();
    })
    .catch((error: unknown) => {
      if (!(error instanceof Undo)) throw error;
    });
  if (!answer) throw new Error('There was no answer.');
  return answer;
}

function messageOf({ json }: RouteAnswer): string {
  return (json as { error?: { message?: string } } | null)?.error?.message ?? '';
}

/** What the person sees of an answer: null when it was taken. */
function seen(answer: RouteAnswer): string | null {
  if (answer.status < 400) return null;
  const fields = fieldsOf(answer);
  const sentences = Object.values(fields).length > 0 ? Object.values(fields) : [messageOf(answer)];
  for (const sentence of sentences) {
    expect(sentence).toMatch(/^\P{Ll}.*[.?]$/su);
    expect(sentence).not.toMatch(PROGRAM_WORDS);
  }
  const at = Object.entries(fields).map(([field, sentence]) =>
    field === '' ? sentence : `${field}: ${sentence}`,
  );
  return `${String(answer.status)} ${at.length > 0 ? at.join(' ') : messageOf(answer)}`;
}

/** The fields that a route takes, each with its schema; none when it takes no object of fields. */
function fieldsTaken(route: RuledRoute): [string, z.ZodType][] {
  interface Layer {
    readonly shape?: Record<string, z.ZodType>;
    readonly def?: { readonly in?: Layer; readonly out?: Layer };
  }
  let layer: Layer | undefined = route.route.body as unknown as Layer;
  // A schema that tidies first and checks then has its fields on one side of the pipe.
  while (layer && !layer.shape) layer = layer.def?.in?.shape ? layer.def.in : layer.def?.out;
  return Object.entries(layer?.shape ?? {});
}

const table: string[] = [];

/** Writes one place to the table: what was sent, gathered by what the person sees. */
function note(place: string, outcomes: ReadonlyMap<string, string | null>): void {
  const bySentence = new Map<string | null, string[]>();
  for (const [sent, what] of outcomes) bySentence.set(what, [...(bySentence.get(what) ?? []), sent]);
  for (const [what, sent] of bySentence)
    table.push(`| ${place} | ${sent.join('; ')} | ${(what ?? 'taken').replaceAll('|', '\\|')} |`);
}

const writers = doors.filter(([, { thing }]) => thing.route.verb.rule.kind === 'write');
const takers = doors.filter(([, { thing }]) => fieldsTaken(thing).length > 0);

test.each(Object.entries(BAD_BODIES))(
  'a body that is %s is refused in one sentence everywhere',
  async (_sent, given) => {
    const request = { body: given.body, headers: { 'content-type': given.type } };
    const answers: RouteAnswer[] = [];
    for (const [, { file, thing }] of writers) answers.push(await call(thing, file, request));
    expect([...new Set(answers.map(({ status }) => status))]).toEqual([400]);
    expect(new Set(answers.map(seen)).size).toBe(1);
  },
);

test.each(takers)('%s says at its field what was wrong, and never breaks', async (door, { file, thing }) => {
  const writes = thing.route.verb.rule.kind === 'write';
  const fields = fieldsTaken(thing);
  const usual = Object.fromEntries(fields.map(([name, schema]) => [name, usualValue(name, schema)] as const));
  for (const [name] of fields) {
    const outcomes = new Map<string, string | null>();
    for (const [sent, value] of Object.entries(BAD_VALUES)) {
      const values = { ...usual, [name]: value };
      const query = Object.fromEntries(
        Object.entries(values).flatMap(([key, one]) => (one == null ? [] : [[key, String(one as string)]])),
      );
      const answer = await call(thing, file, writes ? { body: values } : { query });
      expect(answer.status, `${name}: ${sent}, answered ${JSON.stringify(answer.json)}`).toBeLessThan(500);
      const what = seen(answer);
      // An address cannot hold half a character.
      if (writes && UNKEPT.includes(sent))
        expect(what, sent).toContain('a character in it that cannot be kept');
      else outcomes.set(sent, what);
    }
    note(`${door} · ${name}`, outcomes);
  }
});

test('what is sent and what the person sees stands in a table', async () => {
  const head = ['| door and field | sent | the person sees |', '| --- | --- | --- |'];
  await expect([...head, ...table, ''].join('\n')).toMatchFileSnapshot('bad-input.md');
});
