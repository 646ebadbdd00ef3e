import { changeBuild } from '../../../src/features/builds/server/change-build.ts';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { bringInEpisodes } from '../../../src/features/episodes/server/bring-in-episodes.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { publishEdition } from '../../../src/features/episodes/server/publish-edition.ts';
import { setVideo } from '../../../src/features/episodes/server/set-video.ts';
import { answerQuestion } from '../../../src/features/questions/server/answer-question.ts';
import { addPart } from '../../../src/features/parts/server/add-part.ts';
import { LIST, NEXT_LIST, takeList } from '../edits.ts';
import { addSubscribers, tokensOf } from '../audience.ts';
import { inWorkshop, type TestPerson } from '../people.ts';
import { filmADay } from '../footage.ts';
import { ask } from '../questions.ts';
import { addWorksheet } from '../../../src/features/worksheets/server/add-worksheet.ts';
import { type Owner, type Product } from './product.ts';

/** What the pages have to show: a workshop with its team, an invitation that waits, and a build on show with an episode. */
export interface World {
  readonly owner: Owner;
  readonly editor: TestPerson;
  readonly viewer: TestPerson;
  readonly invited: TestPerson;
  readonly invitation: string;
  /** Its name in addresses. */
  readonly build: string;
  readonly part: string;
  /** A draft. */
  readonly episode: string;
  /** One on show, with its video elsewhere. */
  readonly published: string;
  /** Someone who asked to be mailed, and the tokens of their links. */
  readonly subscriber: { readonly id: string; readonly confirm: string; readonly leave: string };
  /** One that is risky and answered by the owner, and one that waits. */
  readonly question: string;
  readonly waiting: string;
  /** Of a day with two cameras and a gap. */
  readonly clip: string;
  /** One for everyone. */
  readonly worksheet: string;
}

const PART = {
  number: '117',
  name: 'Drum shaft',
  kind: 'made',
  quantity: 1,
  material: 'Bright bar 25',
  size: '25 h9 × 412 mm',
  aliases: ['the long shaft'],
  inPlans: true,
  remark: '',
} as const;

const EPISODE = {
  number: 1,
  title: 'The frame, and why it is square',
  address: 'https://video.example/watch/the-frame',
  publishedOn: '2026-03-14',
};

/** Makes it, by the product's own verbs. */
export async function makeWorld(product: Product): Promise<World> {
  const owner = await product.owner('Wilhelmina Featherstonehaugh', 'Shed at the End of Long Marsh Lane');
  const editor = await product.person('Bo Lind');
  await product.join(owner, editor, 'editor');
  const invited = await product.person('Somebody With A Long Address');
  const invitation = await product.invite(owner, invited.email, 'moderator');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  const about = 'A frame press with a powered mill drum.';
  const plan = { name: 'Orchard press and apple mill', slug: 'press', about, plannedEpisodes: 6 };
  const { slug: build } = await makeBuild(context, plan);
  await changeBuild(context, { ...plan, build, currency: 'GBP', visibility: 'public', version: 1 });
  await bringInEpisodes(context, { build, episodes: [EPISODE] });
  const { id: part } = await addPart(context, { ...PART, build });
  const { id: episode } = await makeEpisode(context, { build, title: 'The drum and its shaft' });
  const { id: published } = await makeEpisode(context, { build, title: 'The mill drum, turned true' });
  const ref = { build, episode: published };
  await setVideo(context, {
    ...ref,
    fileId: null,
    address: 'https://video.example/watch/drum',
    length: '10:00',
  });
  await publishEdition(context, { ...ref, version: (await getDesk(context, ref)).episode.version });
  await takeList(context, published, LIST, {}, build);
  await takeList(context, published, NEXT_LIST, {}, build);
  const [subscriber = ''] = await addSubscribers(
    product.services,
    { workshopId: context.workshop.id },
    owner.workshop,
    3,
  );
  const viewer = await product.person('Ida Kemp');
  const asking = await inWorkshop(product.services, viewer, owner.workshop);
  const asked = { build, episode: 1, t: 75, parts: [part] };
  const question = await ask(asking, { ...asked, text: 'Is the frame strong enough for 12 tonnes?' });
  const text = '**No.** It is drawn for 8, and I did the sums for 8 only.';
  await answerQuestion(context, { question, text, send: 'answer', version: 0 });
  const waiting = await ask(asking, { ...asked, text: 'Which glue holds the slats?' });
  const clip = await filmADay(context, build);
  const { id: worksheet } = await addWorksheet(context, {
    build,
    sheet: 'ram',
    title: 'What the press gives',
    inputs: {
      bore: '100',
      rod: '45',
      stroke: '600',
      pressure: '2500 psi',
      pump: '11 gpm@650 psi, 3 gpm@2500 psi',
      pressing: '80',
    },
    of: { kind: 'part', id: part },
    visibility: 'public',
  });
  return {
    owner,
    published,
    subscriber: { id: subscriber, ...tokensOf(product.services, subscriber) },
    editor,
    viewer,
    invited,
    invitation,
    build,
    part,
    clip,
    episode,
    question,
    waiting,
    worksheet,
  };
}
