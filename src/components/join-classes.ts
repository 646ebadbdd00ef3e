/** One `className` out of the names that apply, or nothing when none does. */
export function joinClasses(...names: readonly (string | false | null | undefined)[]): string | undefined {
  const given = names.filter((name) => name !== false && name != null && name !== '');
  return given.length === 0 ? undefined : given.join(' ');
}
