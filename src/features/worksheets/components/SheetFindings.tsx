import { CautionNote } from '../../../components/CautionNote.tsx';
import { Notice } from '../../../components/Notice.tsx';
import { Table } from '../../../components/Table.tsx';
import { sayPublished } from '../../../domain/cautions/say-sources.ts';
import { USUAL_CAUTIONS } from '../../../domain/cautions/usual-cautions.ts';
import { PLANNING_GUIDE, type Source, type Worked } from '../../../domain/worksheets/worksheet.ts';

const STANDINGS: Record<Source['standing'], string> = {
  published: 'published',
  practice: 'common practice',
  memory: 'from memory: look it up before you rely on it',
};

const COLUMNS = [
  { key: 'what', label: 'What' },
  { key: 'value', label: 'Result' },
  { key: 'formula', label: 'Formula' },
  { key: 'numbers', label: 'Numbers put in' },
];

/** What is off about these inputs, in the worksheet's own words. */
export function SheetWarnings({ warnings }: Pick<Worked<unknown>, 'warnings'>) {
  return warnings.map((warning) => (
    <Notice key={warning} tone="caution">
      {warning}
    </Notice>
  ));
}

/** The result with its working. */
export function SheetWorking({ working }: Pick<Worked<unknown>, 'working'>) {
  const rows = working.map(({ what, formula, numbers, value }, at) => ({
    id: `${String(at)} ${what}`,
    cells: { what, value: <strong className="font-mono">{value}</strong>, formula, numbers },
  }));
  return <Table caption="Result and working" hideCaption columns={COLUMNS} rows={rows} />;
}

function Lines({ title, lines }: { readonly title: string; readonly lines: readonly string[] }) {
  if (lines.length === 0) return null;
  return (
    <div>
      <h2 className="text-base">{title}</h2>
      <ul className="list-disc ps-5">
        {lines.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </div>
  );
}

/** What has to stand beside every result: where it holds, what it does not check, sources, cautions. */
export function SheetStanding({ limits, notChecked, sources, cautions }: Omit<Worked<unknown>, 'result'>) {
  const said = sources.map(
    ({ title, clause, standing }) => `${title}${clause === '' ? '' : `, ${clause}`} (${STANDINGS[standing]})`,
  );
  return (
    <div className="grid gap-4">
      <p className="border-s-4 border-primer ps-3 font-bold">{PLANNING_GUIDE}</p>
      {cautions.map((topic) => {
        const { label, words, sources: published } = USUAL_CAUTIONS[topic];
        return <CautionNote key={topic} label={label} words={words} source={sayPublished(published)} />;
      })}
      <div className="grid gap-4 text-sm lg:grid-cols-3">
        <Lines title="Where it holds" lines={limits} />
        <Lines title="What it does not check" lines={notChecked} />
        <Lines title="Sources" lines={said} />
      </div>
    </div>
  );
}
