import { buildParams } from '../../../../../../../../features/builds/build.ts';
import { AddClipsInput, KeptClips } from '../../../../../../../../features/footage/footage.ts';
import { addClips } from '../../../../../../../../features/footage/server/add-clips.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: addClips,
  params: buildParams,
  body: AddClipsInput,
  answer: KeptClips,
});
