import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { loadStages } from '../../builds/server/load-stages.ts';

/** The id of the stage that was chosen. @throws Invalid at `stage` when the build has none such any more */
export async function findStage(
  context: WorkshopContext,
  buildId: string,
  stage: string | null,
): Promise<string | null> {
  if (stage === null) return null;
  const found = (await loadStages(context, buildId)).find(({ id }) => id === stage);
  if (!found) throw new Invalid({ stage: 'That stage is not in this build any more. Choose another.' });
  return found.id;
}
