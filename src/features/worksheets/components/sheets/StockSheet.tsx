import { Button } from '../../../../components/Button.tsx';
import { type Answer } from '../../../../domain/answer.ts';
import { STOCK_INPUTS, type StockResult } from '../../../../domain/stock/stock-worksheet.ts';
import { type Worked } from '../../../../domain/worksheets/worksheet.ts';
import { findErrors, toQuery, type Typed } from '../../given.ts';
import { SheetField } from '../SheetField.tsx';
import { SheetStanding, SheetWarnings, SheetWorking } from '../SheetFindings.tsx';
import { CuttingPlan } from './CuttingPlan.tsx';

type StockSheetProps = {
  readonly typed: Typed;
  /** Null as long as there is nothing to plan. */
  readonly worked: Answer<Worked<StockResult>> | null;
};

const EXAMPLE = { pieces: '1200, 4, rail\n800, 6, slat\n475, 8, brace', length: '6000', kerf: '2.5' };

/** The cutting plan: made by the server, for it takes a solver; the form works without scripts. */
export function StockSheet({ typed, worked }: StockSheetProps) {
  const errors = findErrors(typed, STOCK_INPUTS);
  return (
    <div className="grid content-start items-start gap-6 lg:grid-cols-[minmax(18rem,1fr)_minmax(0,2fr)]">
      <form method="get" className="no-print grid gap-4 border border-line bg-sheet px-4 py-4">
        {Object.entries(STOCK_INPUTS).map(([name, field]) => (
          <SheetField key={name} name={name} field={field} text={typed[name] ?? ''} error={errors[name]} />
        ))}
        <div className="flex flex-wrap items-center gap-2">
          <Button type="submit" variant="primary">
            Plan the cuts
          </Button>
          <Button href={toQuery(EXAMPLE)} variant="quiet">
            Fill in an example
          </Button>
        </div>
      </form>
      <section aria-label="Result" className="grid min-w-0 gap-4">
        {worked === null && (
          <p className="text-ink-soft">The plan stands here once there are pieces and bars.</p>
        )}
        {worked?.ok === false && <p className="font-medium text-primer">{worked.error}</p>}
        {worked?.ok === true && (
          <>
            <SheetWarnings warnings={worked.value.warnings} />
            <CuttingPlan {...worked.value.result} />
            <SheetWorking working={worked.value.working} />
            <SheetStanding {...worked.value} />
          </>
        )}
      </section>
    </div>
  );
}
