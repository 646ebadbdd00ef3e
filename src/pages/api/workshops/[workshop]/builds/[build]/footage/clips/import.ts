import { buildParams } from '../../../../../../../../features/builds/build.ts';
import { ImportClipsInput, KeptClips } from '../../../../../../../../features/footage/footage.ts';
import { importClips } from '../../../../../../../../features/footage/server/import-clips.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: importClips,
  params: buildParams,
  body: ImportClipsInput,
  answer: KeptClips,
  limit: [{ name: 'import-clips', by: 'account', tries: 60, seconds: 600 }],
  form: {
    page: ({ workshop, build }) => paths.addFootage(workshop, build),
    done: () => null,
  },
});
