import { makeWorkshop } from '../features/workshops/server/make-workshop.ts';
import { type Services } from '../server/services.ts';
import { addSecondFactor, contextFor, DEMO_PASSWORD, joinTeam, makePerson } from './people.ts';
import { seedPress } from './press.ts';
import { seedQuestions } from './press-questions.ts';
import { seedSubscribers } from './subscribers.ts';

const SLUG = 'marram-lane';

const PEOPLE = {
  owner: { name: 'Wren Hallam', email: 'wren@marram-lane.example' },
  editor: { name: 'Idris Cole', email: 'idris@marram-lane.example' },
  moderator: { name: 'Tove Askew', email: 'tove@marram-lane.example' },
  viewer: { name: 'Sam Penhale', email: 'sam@example.com' },
  builder: { name: 'Ana Brightwell', email: 'ana@example.com' },
} as const;

/** One line of what `npm start` prints. */
export interface DemoAccount {
  readonly who: string;
  readonly email: string;
  readonly password: string;
  readonly secondFactorKey?: string;
}

/** Fills an empty database with the demo, by the verbs that people use. */
export async function seedDemo(
  services: Services,
  tokenFor: (name: string) => string,
): Promise<DemoAccount[]> {
  const made = await makePerson(services, PEOPLE.owner, tokenFor);
  await makeWorkshop(await contextFor(services, made, null), {
    name: 'Marram Lane Workshop',
    slug: SLUG,
    timeZone: 'Europe/London',
  });
  const { person: owner, key } = await addSecondFactor(services, made);
  const editor = await makePerson(services, PEOPLE.editor, tokenFor);
  await joinTeam(services, { owner, slug: SLUG }, editor, 'editor');
  const moderator = await makePerson(services, PEOPLE.moderator, tokenFor);
  await joinTeam(services, { owner, slug: SLUG }, moderator, 'moderator');
  await services.storage.prepare();
  await seedPress({
    owner: await contextFor(services, owner, SLUG),
    editor: await contextFor(services, editor, SLUG),
  });
  const viewer = await makePerson(services, PEOPLE.viewer, tokenFor);
  const builder = await makePerson(services, PEOPLE.builder, tokenFor);
  await seedQuestions({
    owner: await contextFor(services, owner, SLUG),
    editor: await contextFor(services, editor, SLUG),
    moderator: await contextFor(services, moderator, SLUG),
    viewer: await contextFor(services, viewer, SLUG),
    builder: await contextFor(services, builder, SLUG),
    anyone: await contextFor(services, null, SLUG),
  });
  await seedSubscribers(await contextFor(services, owner, SLUG), await contextFor(services, null, SLUG));
  return Object.entries(PEOPLE).map(([who, { email }]) => ({
    who,
    email,
    password: DEMO_PASSWORD,
    ...(who === 'owner' && { secondFactorKey: key }),
  }));
}
