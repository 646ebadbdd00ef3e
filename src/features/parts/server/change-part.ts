import { loadBuild } from '../../builds/server/load-build.ts';
import { verb } from '../../../server/verb.ts';
import { type PartFields } from '../part.ts';
import { applyChange } from './apply-change.ts';
import { loadPart } from './load-parts.ts';

/** Changes what a part says; the earlier text is kept. @throws Conflict, or Invalid at `number` */
export const changePart = verb(
  { may: 'part.change' },
  async (
    context,
    input: PartFields & { readonly build: string; readonly part: string; readonly version: number },
  ) => {
    const { build, part, version, number, name, kind, quantity, material, size, aliases, inPlans, remark } =
      input;
    const { id: buildId } = await loadBuild(context, build);
    const { id } = await loadPart(context, buildId, part);
    const fields = { number, name, kind, quantity, material, size, aliases: [...aliases], inPlans, remark };
    await applyChange(context, buildId, { do: 'change', id, version, fields });
    return { id, version: version + 1 };
  },
);
