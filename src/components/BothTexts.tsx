type BothTextsProps = {
  /** What differs: what the person entered and what is stored, by the field's label. */
  readonly differences: readonly { readonly label: string; readonly mine: string; readonly stored: string }[];
};

/** What two people wrote into the same fields, side by side. Nothing when they wrote the same. */
export function BothTexts({ differences }: BothTextsProps) {
  if (differences.length === 0) return null;
  return (
    <table className="ruled-table border border-line bg-sheet" data-stack="">
      <caption>Two versions of it</caption>
      <thead>
        <tr>
          <th scope="col">Field</th>
          <th scope="col">You entered</th>
          <th scope="col">Stored now</th>
        </tr>
      </thead>
      <tbody>
        {differences.map(({ label, mine, stored }) => (
          <tr key={label}>
            <th scope="row">{label}</th>
            <td data-label="You entered">
              <span className="break-words whitespace-pre-line">{mine === '' ? 'nothing' : mine}</span>
            </td>
            <td data-label="Stored now">
              <span className="break-words whitespace-pre-line">{stored === '' ? 'nothing' : stored}</span>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
