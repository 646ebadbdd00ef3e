import { verb } from '../../../server/verb.ts';
import { setStretch, type StretchRef } from './set-stretch.ts';

/** Ends a stretch of work now. @throws NotFound, Conflict */
export const stopStretch = verb({ may: 'footage.change' }, (context, input: StretchRef) =>
  setStretch(context, input, { untilAt: context.now }),
);
