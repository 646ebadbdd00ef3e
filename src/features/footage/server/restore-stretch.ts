import { verb } from '../../../server/verb.ts';
import { setStretch, type StretchRef } from './set-stretch.ts';

/** Brings a deleted stretch of work back. @throws NotFound, Conflict */
export const restoreStretch = verb({ may: 'footage.change' }, (context, input: StretchRef) =>
  setStretch(context, input, { deletedAt: null }, { deleted: true }),
);
