import { type ReactNode, useEffect, useRef, useState } from 'react';
import { Button } from '../../../components/Button.tsx';
import { copy } from '../../../client/copy.ts';
import {
  type Field,
  runWorksheet,
  type Worked,
  type Worksheet,
} from '../../../domain/worksheets/worksheet.ts';
import { findErrors, findMissing, toGiven, toQuery, type Typed } from '../given.ts';
import { SheetInputs } from './SheetInputs.tsx';
import { SheetField } from './SheetField.tsx';
import { SheetStanding, SheetWarnings, SheetWorking } from './SheetFindings.tsx';

type Fields = Readonly<Record<string, Field<unknown>>>;

export type SheetProps = {
  /** The inputs as they were typed. */
  readonly typed: Typed;
  /** Where a form that is kept is sent; without it the inputs stand in the address. */
  readonly action?: string | undefined;
  /** What its button says. */
  readonly submit?: string | undefined;
  /** Shows the inputs instead of asking for them. */
  readonly reading?: boolean | undefined;
  /** Fields of the form beside the worksheet’s own. */
  readonly children?: ReactNode;
};

type Definition<Inputs extends Fields, Result> = {
  readonly sheet: Worksheet<Inputs, Result>;
  /** Inputs that show what it does. */
  readonly example: Typed;
  /** A picture or a table of its own, before the working. */
  readonly picture?: (worked: Worked<Result>, given: Typed) => ReactNode;
};

function sayWaiting(missing: readonly string[], errors: Typed): string {
  if (Object.keys(errors).length > 0) return 'An input cannot be read yet; the sentence under it says why.';
  return `To work it out, give ${missing.join(', ').toLowerCase()}.`;
}

/** The page of a worksheet: it reads along while one types; without scripts the form sends its inputs in the address. */
export function Sheet<Inputs extends Fields, Result>({
  sheet,
  example,
  picture,
  typed: first,
  action,
  submit = 'Work it out',
  reading = false,
  children,
}: Definition<Inputs, Result> & SheetProps) {
  const { inputs } = sheet;
  const [typed, setTyped] = useState(first);
  const copied = useRef<HTMLSpanElement>(null);
  const errors = findErrors(typed, inputs);
  const missing = findMissing(typed, inputs);
  const blank = Object.values(typed).every((text) => text === '');
  const ready = !blank && missing.length === 0 && Object.keys(errors).length === 0;
  const worked = ready ? runWorksheet(sheet, toGiven(typed, inputs)) : null;
  const query = toQuery(typed);
  useEffect(() => {
    if (action !== undefined || reading) return;
    // Browsers refuse too many in a row.
    const timer = setTimeout(() => {
      history.replaceState(history.state, '', `${location.pathname}${query}`);
    }, 500);
    return () => {
      clearTimeout(timer);
    };
  }, [query, action, reading]);
  return (
    <div className="grid content-start items-start gap-6 lg:grid-cols-[minmax(18rem,1fr)_minmax(0,2fr)]">
      {reading ? (
        <SheetInputs inputs={inputs} typed={typed} />
      ) : (
        <form
          method={action === undefined ? 'get' : 'post'}
          action={action}
          className="grid gap-4 border border-line bg-sheet px-4 py-4"
        >
          {children}
          {Object.entries(inputs).map(([name, field]) => (
            <SheetField
              key={name}
              name={name}
              field={field}
              text={typed[name] ?? ''}
              error={errors[name]}
              onChange={(text) => {
                setTyped((before) => ({ ...before, [name]: text }));
              }}
            />
          ))}
          <div className="flex flex-wrap items-center gap-2">
            <Button type="submit" variant="primary">
              {submit}
            </Button>
            {action === undefined && (
              <Button href={toQuery(example)} variant="quiet">
                Fill in an example
              </Button>
            )}
          </div>
        </form>
      )}
      <section aria-label="Result" className="grid min-w-0 gap-4">
        <div role="status" className="grid gap-4">
          {worked === null && (
            <p className="text-ink-soft">
              {blank ? 'The result stands here as soon as there are inputs.' : sayWaiting(missing, errors)}
            </p>
          )}
          {worked?.ok === false && <p className="font-medium text-primer">{worked.error}</p>}
          {worked?.ok === true && <SheetWarnings warnings={worked.value.warnings} />}
        </div>
        {worked?.ok === true && (
          <>
            {picture?.(worked.value, typed)}
            <SheetWorking working={worked.value.working} />
            {action === undefined && !reading && (
              <p className="flex flex-wrap items-center gap-2 text-sm">
                <a href={query === '' ? '?' : query} className="link">
                  A link that carries these inputs
                </a>
                <Button
                  size="small"
                  onClick={() => {
                    void copy(new URL(query, location.href).href, copied.current, 'Copied.');
                  }}
                >
                  Copy it
                </Button>
                <span ref={copied} role="status" />
              </p>
            )}
            <SheetStanding {...worked.value} />
          </>
        )}
      </section>
    </div>
  );
}
