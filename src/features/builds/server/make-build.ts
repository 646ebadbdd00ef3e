import { newId } from '../../../db/columns.ts';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { type MakeBuild } from '../build.ts';

/** Makes a build, private until it is put on show. @throws Invalid at `slug` when the name is taken */
export const makeBuild = verb(
  { may: 'build.change' },
  async ({ db, workshop }, { name, slug, about, plannedEpisodes }: MakeBuild) => {
    const id = newId();
    await db.insert(builds).values({ id, workshopId: workshop.id, name, about, plannedEpisodes });
    await onUniqueViolation(
      { build_slugs_pkey: { slug: 'Another build of this workshop has that address name. Choose another.' } },
      () => db.insert(buildSlugs).values({ workshopId: workshop.id, slug, buildId: id, current: true }),
    );
    await announcePageChanges(db, [`workshop:${workshop.id}`]);
    return { id, slug };
  },
);
