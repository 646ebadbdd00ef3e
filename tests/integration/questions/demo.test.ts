import { expect, test } from 'vitest';
import { makeBuild } from '../../../src/features/builds/server/make-build.ts';
import { changeBuild } from '../../../src/features/builds/server/change-build.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { publishEdition } from '../../../src/features/episodes/server/publish-edition.ts';
import { setVideo } from '../../../src/features/episodes/server/set-video.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { listQuestions } from '../../../src/features/questions/server/list-questions.ts';
import { seedQuestions } from '../../../src/seed/press-questions.ts';
import { aPerson, aWorkshop, inWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();

test('the demo has questions in every state', async () => {
  const { slug, owner, editor, moderator, viewer, anyone } = await aWorkshop(services);
  const build = 'orchard-press';
  const plan = { name: 'Orchard press', slug: build, about: '', plannedEpisodes: 6 };
  await makeBuild(owner, plan);
  await changeBuild(owner, { ...plan, build, currency: 'GBP', visibility: 'public', version: 1 });
  const { id: episode } = await makeEpisode(owner, { build, number: 4, title: 'The drum shaft' });
  await setVideo(owner, { build, episode, fileId: null, address: 'https://video.example/4', length: '1:50' });
  const { version } = (await getDesk(owner, { build, episode })).episode;
  await publishEdition(owner, { build, episode, version });
  const builder = await inWorkshop(services, await aPerson(services), slug);
  await seedQuestions({ owner, editor, moderator, viewer, builder, anyone });
  const said = async (list: 'waiting' | 'unanswered' | 'answered' | 'hidden') =>
    (await listQuestions(owner, { list })).items.map((one) =>
      [
        one.source,
        one.answerState,
        one.risky && 'risky',
        one.urgentAt && 'urgent',
        one.mergedInto && 'merged',
      ]
        .filter(Boolean)
        .join(' '),
    );
  expect(await said('waiting')).toEqual(['account unanswered risky urgent', 'mail unanswered']);
  expect((await said('unanswered')).sort()).toEqual(['account drafted risky', 'account unanswered']);
  expect((await said('answered')).sort()).toEqual([
    'account answered',
    'account answered risky',
    'account unanswered merged',
    'pasted answered risky',
  ]);
  expect(await said('hidden')).toEqual(['account unanswered']);
});
