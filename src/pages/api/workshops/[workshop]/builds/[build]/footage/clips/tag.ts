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
    page: ({ workshop, build }) => paths.footage(workshop, build),
    done: (_, { workshop, build }) => paths.footage(workshop, build),
  },
});
