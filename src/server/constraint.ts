import { type FieldErrors, Invalid } from './errors.ts';

/**
 * Runs a write; when it breaks a unique constraint that is named here, says so at its field.
 * @param sentences what to say, by the constraint's name
 * @throws Invalid
 */
export async function onUniqueViolation<Result>(
  sentences: Readonly<Record<string, FieldErrors>>,
  write: () => PromiseLike<Result>,
): Promise<Result> {
  try {
    return await write();
  } catch (error) {
    const sentence = sentences[constraintOf(error) ?? ''];
    throw sentence ? new Invalid(sentence) : error;
  }
}

/** The constraint that a driver's error names; Drizzle keeps that error as the cause of its own. */
function constraintOf(error: unknown): string | undefined {
  const source = error instanceof Error && error.cause !== undefined ? error.cause : error;
  if (typeof source === 'object' && source !== null && 'constraint' in source)
    return String(source.constraint);
  return undefined;
}
