import { newId } from '../../../db/columns.ts';
import { cameras } from '../../../db/schema/footage.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type CameraFields } from '../footage.ts';
import { cameraColumns, NAME_TAKEN } from './camera-columns.ts';

/** Adds a camera to the workshop. @throws Invalid at `name` when there is one of that name */
export const addCamera = verb(
  { may: 'footage.change' },
  async (context, { build, ...fields }: CameraFields & { readonly build: string }) => {
    await loadBuild(context, build);
    const id = newId();
    await onUniqueViolation(NAME_TAKEN, () =>
      context.db.insert(cameras).values({ id, workshopId: context.workshop.id, ...cameraColumns(fields) }),
    );
    return { id, version: 1 };
  },
);
