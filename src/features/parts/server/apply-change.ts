import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, Invalid } from '../../../server/errors.ts';
import { type Part, type PartChange } from '../part.ts';
import { applyChanges } from './apply-changes.ts';

/**
 * Takes one change, as a form of its own makes it.
 * @throws Conflict with the stored part; Invalid with the part's own fields
 */
export async function applyChange(
  context: WorkshopContext,
  buildId: string,
  change: PartChange,
): Promise<Part | undefined> {
  try {
    return (await applyChanges(context, buildId, [change]))[0];
  } catch (error) {
    if (error instanceof Invalid) {
      throw new Invalid(
        Object.fromEntries(
          Object.entries(error.fields).map(([field, text]) => [field.replace(/^changes\.0\.?/, ''), text]),
        ),
      );
    }
    if (error instanceof Conflict) {
      const [stored] = (error.stored as { parts: readonly unknown[] }).parts;
      throw new Conflict(
        stored,
        'Someone else saved this part in the meantime. What you entered is kept below, beside what is stored; look it over and save again.',
      );
    }
    throw error;
  }
}
