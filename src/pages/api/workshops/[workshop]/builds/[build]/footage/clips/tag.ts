import { buildParams } from '../../../../../../../../features/builds/build.ts';
import { TagClipsInput, TaggedClips } from '../../../../../../../../features/footage/footage.ts';
import { tagClips } from '../../../../../../../../features/footage/server/tag-clips.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: tagClips,
  params: buildParams,
  body: TagClipsInput,
  answer: TaggedClips,
  form: {
    page: ({ workshop, build }, { back = '' }) => within(paths.footage(workshop, build), back),
    done: (_, { workshop, build, back }) => within(paths.footage(workshop, build), back),
  },
});

/** A page of the footage, and no other place. */
function within(footage: string, back: string): string {
  return back.startsWith(`${footage}?`) ? back : footage;
}
