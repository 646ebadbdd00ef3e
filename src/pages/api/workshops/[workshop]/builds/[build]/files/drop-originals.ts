import { buildParams } from '../../../../../../../features/builds/build.ts';
import { DroppedOriginals, DropOriginalsInput } from '../../../../../../../features/files/file.ts';
import { dropOriginals } from '../../../../../../../features/files/server/drop-originals.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: dropOriginals,
  params: buildParams,
  body: DropOriginalsInput,
  answer: DroppedOriginals,
  form: {
    page: ({ workshop }) => paths.storage(workshop),
    done: (_result, { workshop }) => paths.storage(workshop),
  },
});
