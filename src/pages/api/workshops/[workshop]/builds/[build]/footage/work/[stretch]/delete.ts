import {
  stretchParams,
  StretchRow,
  VersionInput,
} from '../../../../../../../../../features/footage/footage.ts';
import { deleteStretch } from '../../../../../../../../../features/footage/server/delete-stretch.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteStretch,
  params: stretchParams,
  body: VersionInput,
  answer: StretchRow,
  form: {
    page: ({ workshop, build }) => paths.footage(workshop, build),
    done: ({ id, version }, { workshop, build }) =>
      paths.footage(workshop, build, { undo: id, version: String(version) }),
  },
});
