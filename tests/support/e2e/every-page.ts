import { type Page, type Response } from '@playwright/test';
import { filesBelow } from '../architecture/import-graph.ts';
import { paths } from '../../../src/paths.ts';
import { PASSWORD, type TestPerson } from '../people.ts';
import { readEdl } from '../../../src/domain/edit/read-edl.ts';
import { writeOtio } from '../../../src/domain/edit/write-otio.ts';
import { LIST } from '../edits.ts';
import { enterPassword } from './steps.ts';
import { type World } from './world.ts';
import { newAddress } from './product.ts';

/** One page in one state. */
export interface PageState {
  /** The route's file below src/pages, without its ending. */
  readonly route: string;
  /** What is special about this state. */
  readonly state?: string;
  readonly as?: (world: World) => TestPerson;
  readonly at: (world: World) => string;
  /** What brings the page into this state; ends in a navigation. */
  readonly then?: (page: Page) => Promise<void>;
}

const owner = ({ owner: who }: World) => who;
const editor = ({ editor: who }: World) => who;
const viewer = ({ viewer: who }: World) => who;
const bench =
  (rest = '') =>
  (world: World) =>
    `/bench/${world.owner.workshop}${rest}`;
const inBuild =
  (rest: (world: World) => string = () => '') =>
  (world: World) =>
    `/bench/${world.owner.workshop}/${world.build}${rest(world)}`;

async function startSecondFactor(page: Page): Promise<void> {
  await page.getByLabel('Your password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Start' }).click();
}

async function sendNamelessSignUp(page: Page): Promise<void> {
  await page.getByLabel('Your name').fill('<>');
  await page.getByLabel('E-mail address').fill('someone@example.com');
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign up' }).click();
}

async function askForLink(page: Page): Promise<void> {
  await page.getByLabel('E-mail address').fill('nobody@example.com');
  await page.getByRole('button', { name: 'Mail me a link' }).click();
}

async function sendHalfAnAddress(page: Page): Promise<void> {
  await page.getByLabel('E-mail address').fill('jo@example');
  await page.getByRole('button', { name: 'Mail me the next episode' }).click();
}

async function askAgain(page: Page): Promise<void> {
  await page.getByLabel('Your question').fill('Is this frame strong enough for 12 tonnes?');
  await page.getByRole('button', { name: 'Send the question' }).click();
}

async function lookAtEdit(page: Page): Promise<void> {
  const read = readEdl(LIST, { rate: { num: 25, den: 1 } });
  const buffer = Buffer.from(read.ok ? writeOtio(read.value) : '');
  await page
    .getByLabel('Edit list or timeline')
    .setInputFiles({ name: 'press-4.otio', mimeType: 'application/json', buffer });
  await page.getByRole('button', { name: 'Look at it' }).click();
}

/** Every page, in every state that looks different. */
export const PAGES: readonly PageState[] = [
  { route: 'index', at: () => '/' },
  { route: '404', at: () => '/nowhere-at-all' },
  { route: 'error', as: editor, at: bench('/settings') },
  { route: '500', at: () => '/500' },
  { route: 'worksheets/index', at: () => '/worksheets' },
  { route: 'worksheets/lengths', at: () => '/worksheets/lengths?text=38' },
  { route: 'worksheets/holes', at: () => '/worksheets/holes?thread=M12' },
  { route: 'worksheets/fits', at: () => '/worksheets/fits?size=25&hole=H7&shaft=k6' },
  {
    route: 'worksheets/seats',
    at: () => '/worksheets/seats?bore=25&outside=52&shaft=k6&housing=M7&turning=inner',
  },
  {
    route: 'worksheets/stock',
    at: () => '/worksheets/stock?pieces=1200,4,rail%0A800,6&length=6000&offcuts=2400&kerf=2.5',
  },
  { route: 'worksheets/sections', at: () => '/worksheets/sections?shs=50x3&length=6000&quantity=4' },
  { route: 'worksheets/ports', at: () => '/worksheets/ports?diameter=16.6&pitch=19+tpi' },
  { route: 'worksheets/drive', at: () => '/worksheets/drive?rpm=1440&driver=80&driven=240&diameter=300' },
  {
    route: 'worksheets/square',
    at: () => '/worksheets/square?width=800&height=1200&diagonal=1443&other=1441',
  },
  { route: 'w/[workshop]', at: (world) => `/w/${world.owner.workshop}` },
  { route: 'w/[workshop]/[build]/index', at: (world) => `/w/${world.owner.workshop}/${world.build}` },
  {
    route: 'w/[workshop]/[build]/episodes/[number]/index',
    at: (world) => `/w/${world.owner.workshop}/${world.build}/episodes/1`,
  },
  {
    route: 'w/[workshop]/[build]/episodes/[number]/print',
    at: (world) => `/w/${world.owner.workshop}/${world.build}/episodes/1/print`,
  },
  { route: 'w/[workshop]/subscribe', at: (world) => `/w/${world.owner.workshop}/subscribe` },
  {
    route: 'w/[workshop]/subscribe',
    state: 'sent back',
    at: (world) => `/w/${world.owner.workshop}/subscribe`,
    then: sendHalfAnAddress,
  },
  {
    route: 'w/[workshop]/[build]/subscribe',
    at: (world) => `/w/${world.owner.workshop}/${world.build}/subscribe`,
  },
  { route: 'subscriptions/asked', at: () => '/subscriptions/asked' },
  {
    route: 'subscriptions/[subscriber]/confirm',
    at: ({ subscriber }) => paths.confirmSubscription(subscriber.id, subscriber.confirm),
  },
  {
    route: 'subscriptions/[subscriber]/leave',
    at: ({ subscriber }) => paths.leave(subscriber.id, subscriber.leave),
  },
  {
    route: 'w/[workshop]/[build]/parts/[part]',
    at: (world) => `/w/${world.owner.workshop}/${world.build}/parts/${world.part}`,
  },
  {
    route: 'w/[workshop]/[build]/questions/[question]',
    at: (world) => `/w/${world.owner.workshop}/${world.build}/questions/${world.question}`,
  },
  {
    route: 'w/[workshop]/[build]/ask',
    at: (world) => `/w/${world.owner.workshop}/${world.build}/ask?episode=1&t=75`,
  },
  {
    route: 'w/[workshop]/[build]/ask',
    state: 'asked already',
    as: viewer,
    at: (world) => `/w/${world.owner.workshop}/${world.build}/ask?part=${world.part}`,
    then: askAgain,
  },
  { route: 'questions/[question]', at: ({ waiting }) => `/questions/${waiting}?token=abc` },
  { route: 'bench/[workshop]/questions/index', as: editor, at: bench('/questions') },
  {
    route: 'bench/[workshop]/questions/index',
    state: 'answered',
    as: editor,
    at: bench('/questions?list=answered'),
  },
  {
    route: 'bench/[workshop]/questions/[question]',
    state: 'waiting',
    as: editor,
    at: (world) => `/bench/${world.owner.workshop}/questions/${world.waiting}`,
  },
  {
    route: 'bench/[workshop]/questions/[question]',
    state: 'answered',
    as: owner,
    at: (world) => `/bench/${world.owner.workshop}/questions/${world.question}`,
  },
  { route: 'bench/[workshop]/questions/paste', as: editor, at: bench('/questions/paste') },
  { route: 'sign-up/index', at: () => '/sign-up' },
  { route: 'sign-up/index', state: 'sent back', at: () => '/sign-up', then: sendNamelessSignUp },
  { route: 'sign-up/check-mail', at: () => '/sign-up/check-mail' },
  { route: 'confirm', at: () => '/confirm?token=a.b.c' },
  { route: 'sign-in/index', at: () => '/sign-in?next=/account' },
  {
    route: 'sign-in/index',
    state: 'refused',
    at: () => '/sign-in',
    then: (page) => enterPassword(page, newAddress('nobody')),
  },
  { route: 'sign-in/code', at: () => '/sign-in/code' },
  { route: 'sign-in/link', at: () => '/sign-in/link' },
  { route: 'sign-in/link', state: 'asked', at: () => '/sign-in/link', then: askForLink },
  { route: 'sign-in/open', at: () => '/sign-in/open?token=abc' },
  { route: 'reset/index', at: () => '/reset' },
  { route: 'reset/password', at: () => '/reset/password?token=abc' },
  { route: 'invitations/[invitation]', at: ({ invitation }) => invitation },
  {
    route: 'invitations/[invitation]',
    state: 'signed in',
    as: ({ invited }) => invited,
    at: ({ invitation }) => invitation,
  },
  { route: 'invitations/[invitation]', state: 'of another', as: viewer, at: ({ invitation }) => invitation },
  { route: 'account/index', as: owner, at: () => '/account' },
  { route: 'account/new-address', as: viewer, at: () => '/account/new-address?token=abc' },
  { route: 'account/second-factor', state: 'off', as: viewer, at: () => '/account/second-factor' },
  {
    route: 'account/second-factor',
    state: 'started',
    as: viewer,
    at: () => '/account/second-factor',
    then: startSecondFactor,
  },
  { route: 'account/second-factor', state: 'on', as: owner, at: () => '/account/second-factor' },
  { route: 'bench/index', as: viewer, at: () => '/bench' },
  { route: 'bench/new', as: viewer, at: () => '/bench/new' },
  { route: 'bench/[workshop]/index', as: owner, at: bench() },
  { route: 'bench/[workshop]/index', state: 'for an editor', as: editor, at: bench() },
  { route: 'bench/[workshop]/team', as: owner, at: bench('/team') },
  { route: 'bench/[workshop]/team', state: 'for an editor', as: editor, at: bench('/team') },
  { route: 'bench/[workshop]/settings', as: owner, at: bench('/settings') },
  { route: 'bench/[workshop]/storage', as: owner, at: bench('/storage') },
  { route: 'bench/[workshop]/subscribers', as: owner, at: bench('/subscribers') },
  { route: 'bench/[workshop]/[build]/footage/index', as: editor, at: inBuild(() => '/footage') },
  { route: 'bench/[workshop]/[build]/footage/add', as: editor, at: inBuild(() => '/footage/add') },
  { route: 'bench/[workshop]/[build]/footage/cameras', as: editor, at: inBuild(() => '/footage/cameras') },
  { route: 'bench/[workshop]/[build]/footage/files', as: editor, at: inBuild(() => '/footage/files') },
  {
    route: 'bench/[workshop]/[build]/footage/clips/[clip]',
    as: editor,
    at: inBuild(({ clip }) => `/footage/clips/${clip}`),
  },
  { route: 'slate', at: () => paths.slate('Europe/London') },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/preview',
    as: editor,
    at: inBuild(({ episode }) => `/episodes/${episode}/preview`),
  },
  { route: 'bench/[workshop]/new', as: owner, at: bench('/new') },
  { route: 'bench/[workshop]/[build]/index', as: owner, at: inBuild() },
  { route: 'bench/[workshop]/[build]/settings', as: owner, at: inBuild(() => '/settings') },
  { route: 'bench/[workshop]/[build]/stages', as: editor, at: inBuild(() => '/stages') },
  { route: 'bench/[workshop]/[build]/parts/index', as: owner, at: inBuild(() => '/parts') },
  { route: 'bench/[workshop]/[build]/parts/[part]', as: owner, at: inBuild(({ part }) => `/parts/${part}`) },
  { route: 'bench/[workshop]/[build]/parts/import', as: owner, at: inBuild(() => '/parts/import') },
  { route: 'bench/[workshop]/[build]/worksheets/index', as: editor, at: inBuild(() => '/worksheets') },
  {
    route: 'bench/[workshop]/[build]/worksheets/[worksheet]',
    as: editor,
    at: inBuild(({ worksheet }) => `/worksheets/${worksheet}`),
  },
  {
    route: 'w/[workshop]/[build]/worksheets/[worksheet]',
    at: (world) => `/w/${world.owner.workshop}/${world.build}/worksheets/${world.worksheet}`,
  },
  { route: 'bench/[workshop]/[build]/diary', as: editor, at: inBuild(() => '/diary') },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/index',
    as: editor,
    at: inBuild(({ episode }) => `/episodes/${episode}`),
  },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/edit',
    state: 'none yet',
    as: editor,
    at: inBuild(({ episode }) => `/episodes/${episode}/edit`),
  },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/edit',
    as: editor,
    at: inBuild(({ published }) => `/episodes/${published}/edit`),
  },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/edit',
    state: 'looked at',
    as: editor,
    at: inBuild(({ published }) => `/episodes/${published}/edit`),
    then: lookAtEdit,
  },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/text',
    as: editor,
    at: inBuild(({ published }) => `/episodes/${published}/text`),
  },
  { route: 'bench/[workshop]/[build]/episodes/index', as: owner, at: inBuild(() => '/episodes') },
  {
    route: 'bench/[workshop]/[build]/episodes/out-already',
    as: owner,
    at: inBuild(() => '/episodes/out-already'),
  },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/publish',
    as: owner,
    at: inBuild(({ episode }) => `/episodes/${episode}/publish`),
  },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/announcement',
    as: owner,
    at: inBuild(({ published }) => `/episodes/${published}/announcement`),
  },
  {
    route: 'bench/[workshop]/[build]/episodes/[episode]/announcement',
    state: 'refused',
    as: editor,
    at: inBuild(({ episode }) => `/episodes/${episode}/announcement`),
  },
];

/** Has a spec of its own, because the product itself never shows it. */
const ELSEWHERE = ['drawing-set'];

/** The routes below src/pages that show a page. */
export function pageRoutes(): string[] {
  return filesBelow('src/pages')
    .filter((file) => file.endsWith('.astro'))
    .map((file) => file.replace(/^src\/pages\/|\.astro$/g, ''))
    .filter((route) => !ELSEWHERE.includes(route));
}

/** Brings a page into its state. @returns the answer that the document came in */
export async function openState(page: Page, { at, then }: PageState, world: World): Promise<Response> {
  const answer = await page.goto(at(world));
  if (answer === null) throw new Error('The page was not asked for.');
  if (!then) return answer;
  const document = page.waitForResponse((response) => {
    const request = response.request();
    return request.isNavigationRequest() && request.method() === 'POST' && response.status() !== 303;
  });
  await then(page);
  await page.waitForLoadState();
  return document;
}
