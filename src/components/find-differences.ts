/**
 * What a form that came back says otherwise than what is stored.
 * @param labels the fields to compare, with their labels
 * @param entered what was entered; a field that was not sent is not compared
 */
export function findDifferences(
  labels: Readonly<Record<string, string>>,
  entered: Readonly<Record<string, string | undefined>>,
  stored: Readonly<Record<string, string>>,
): { label: string; mine: string; stored: string }[] {
  return Object.entries(labels).flatMap(([field, label]) => {
    const mine = entered[field]?.replaceAll('\r\n', '\n').trim();
    const kept = stored[field] ?? '';
    return mine === undefined || mine === kept ? [] : [{ label, mine, stored: kept }];
  });
}
