import { verb } from '../../../server/verb.ts';
import { setStretch, type StretchRef } from './set-stretch.ts';

/** Deletes a stretch of work; for 30 days restoring it is the inverse. @throws NotFound, Conflict */
export const deleteStretch = verb({ may: 'footage.change' }, (context, input: StretchRef) =>
  setStretch(context, input, { deletedAt: context.now }),
);
