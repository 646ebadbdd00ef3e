import { type Field } from '../../../domain/worksheets/worksheet.ts';
import { type Typed } from '../given.ts';

type SheetInputsProps = {
  readonly inputs: Readonly<Record<string, Field<unknown>>>;
  readonly typed: Typed;
};

/** The inputs of a worksheet as they were typed, with how each was read. */
export function SheetInputs({ inputs, typed }: SheetInputsProps) {
  return (
    <dl className="grid gap-3 border border-line bg-sheet px-4 py-4">
      {Object.entries(inputs).map(([name, { label, otherwise, readBack }]) => {
        const text = typed[name] ?? '';
        const said = text === '' ? otherwise : text;
        if (said === undefined) return null;
        const read = text === '' ? null : (readBack?.(text) ?? null);
        return (
          <div key={name}>
            <dt className="text-sm text-ink-soft">{label}</dt>
            <dd className="font-mono font-semibold">{said}</dd>
            {read !== null && <dd className="font-mono text-sm text-ink-soft">{read}</dd>}
          </div>
        );
      })}
    </dl>
  );
}
