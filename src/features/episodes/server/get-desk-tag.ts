import { sql } from 'drizzle-orm';
import { captions, edits, episodes, videos } from '../../../db/schema/episodes.ts';
import { files } from '../../../db/schema/files.ts';
import { anchors, appearances, chapters, notes } from '../../../db/schema/notes.ts';
import { places } from '../../../db/schema/places.ts';
import { parts } from '../../../db/schema/parts.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type EpisodeRef } from './load-episode.ts';

/**
 * Something that differs whenever what `lookAtDesk` answers does, in one statement over indexes. Versions are summed:
 * of two changes at once the one with the earlier time may be seen last. @throws NotFound
 */
export const getDeskTag = read(
  { may: 'workshop.see-bench' },
  async (context, ref: EpisodeRef): Promise<string> => {
    const build = await loadBuild(context, ref.build);
    const standing = (table: typeof notes | typeof appearances | typeof chapters) =>
      sql`(select concat_ws(' ', count(*) filter (where ${table.deletedAt} is null), sum(${table.version}))
        from ${table} join ${anchors} on ${anchors.id} = ${table.anchorId}
        where ${anchors.episodeId} = ${episodes.id} or ${anchors.id} in (
          select ${places.anchorId} from ${places} where ${places.editId} = draft.id))`;
    const { rows } = await context.db.execute<{ tag: string }>(sql`
      select md5(concat_ws('|', ${context.role}::text, ${episodes.version},
        ${standing(notes)}, ${standing(appearances)}, ${standing(chapters)},
        (select concat_ws(' ', ${videos.id}, ${files.state}) from ${videos}
          left join ${files} on ${files.id} = ${videos.fileId}
          where ${videos.episodeId} = ${episodes.id} order by ${videos.id} desc limit 1),
        (select max(${captions.number}) from ${captions} where ${captions.episodeId} = ${episodes.id}),
        (select concat_ws(' ', count(*) filter (where ${parts.deletedAt} is null), sum(${parts.version}))
          from ${parts} where ${parts.buildId} = ${episodes.buildId}),
        draft.id, draft.places_version
      )) as tag from ${episodes}
      left join lateral (select ${edits.id}, ${edits.placesVersion} from ${edits}
        where ${edits.episodeId} = ${episodes.id} order by ${edits.number} desc limit 1) draft on true
      where ${episodes.id} = ${ref.episode} and ${episodes.buildId} = ${build.id} and ${episodes.deletedAt} is null`);
    const [row] = rows;
    if (!row) throw new NotFound('This episode');
    return row.tag;
  },
);
