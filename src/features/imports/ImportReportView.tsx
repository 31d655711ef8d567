import type { ImportReport } from '#shared/imports.ts';
import { Rail } from '#src/components/Rail.tsx';
import { Soft } from '#src/components/Caution.tsx';
import { formatCount } from '#src/lib/format.ts';

const MADE = { lots: 'Lots', formulas: 'Formulas', people: 'People', moulds: 'Moulds', colourants: 'Colourants' } as const;

/** What the dry run found: every problem by line and column, and what would be made. */
export function ImportReportView({ report }: { report: ImportReport }) {
  return (
    <div className="grid grid-cols-1 gap-5">
      <p className="say text-gauge-s">
        {report.problemCount > 0 ? <><b className="font-[720]">{formatCount(report.problemCount, 'problem')}</b> in {formatCount(report.rows, 'row')}. Nothing is written until there is none.</> : <><b className="font-[720]">{formatCount(report.good, 'batch', 'batches')}</b> can be written{report.alreadyThere > 0 && `, ${report.alreadyThere} are in the log already and stay as they are`}.</>}
      </p>
      <p className="text-row text-ink-2">Answers: {report.answers.found} found, {report.answers.clear} clear, {report.answers.notChecked} not checked. An empty cell is never taken for clear.</p>
      {report.problemCount > 0 && (
        <section>
          <Rail heading="Problems" aside={report.problemCount > report.problems.length ? `first ${report.problems.length} of ${report.problemCount}` : undefined} />
          <div className="max-h-96 overflow-auto" role="region" aria-label="Problems" tabIndex={0}>
            <table className="w-full border-collapse text-row">
              <thead className="sticky top-0 bg-board text-left text-note text-ink-2"><tr><th scope="col" className="py-1.5 pr-4 font-[560]">Line</th><th scope="col" className="pr-4 font-[560]">Column</th><th scope="col" className="font-[560]">What is wrong</th></tr></thead>
              <tbody>{report.problems.map(({ line, column, detail }, index) => <tr key={index} className="border-t border-line"><td className="gauge py-1.5 pr-4">{line}</td><td className="pr-4 whitespace-nowrap">{column}</td><td>{detail}</td></tr>)}</tbody>
            </table>
          </div>
        </section>
      )}
      {report.problemCount === 0 && Object.values(report.creates).some((names) => names.length > 0) && (
        <Soft>
          <p className="font-[640]">The log will get what it does not have yet:</p>
          <ul>{Object.entries(report.creates).filter(([, names]) => names.length > 0).map(([kind, names]) => <li key={kind}>{MADE[kind as keyof typeof MADE]}: {names.slice(0, 30).join(', ')}{names.length > 30 && ` and ${names.length - 30} more`}</li>)}</ul>
        </Soft>
      )}
    </div>
  );
}
