import type { BatchRow } from '#shared/batches.ts';
import type { DueInspection } from '#shared/inspections.ts';
import { Loaf } from '#src/components/Loaf.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { daysBetween } from '#shared/units/days.ts';
import { formatCount } from '#src/lib/format.ts';
import { Link } from 'react-router-dom';

/** Stretches of a loaf's way, by days since it was made. */
const STRETCHES = [
  { name: 'In the mould', says: 'day 0 to 1', from: 0, until: 2 },
  { name: 'Cut', says: 'day 2 to 5', from: 2, until: 6 },
  { name: 'Week 1', says: 'day 6 to 10', from: 6, until: 11 },
  { name: 'Week 2', says: 'day 11 to 20', from: 11, until: 21 },
  { name: 'Week 4', says: 'day 21 to 34', from: 21, until: 35 },
  { name: 'Week 6', says: 'day 35 to 45', from: 35, until: 46 },
  { name: 'Before release', says: 'from day 46', from: 46, until: Infinity },
] as const;

/** Every unsold loaf stands at its age; those that want looking at are pulled over the edge. */
export function OnTheWay({ batches, due, today, batchAddress }: { batches: readonly BatchRow[]; due: readonly DueInspection[]; today: string; batchAddress: (id: string) => string }) {
  const wanted = new Map(due.filter(({ standing }) => standing !== 'coming').map((look) => [look.batchId, look]));
  const bars = batches.reduce((sum, batch) => sum + (batch.bars ?? 0), 0);
  return (
    <section aria-labelledby="way-heading" className="grid grid-cols-1 gap-1">
      <Rail id="way-heading" heading="On the way" aside={`${formatCount(batches.length, 'loaf', 'loaves')}, ${formatCount(bars, 'bar')}. Pulled forward: due. Solid code: late.`} />
      <div tabIndex={0} role="region" aria-label="Loaves by age" className="flex gap-7 overflow-x-auto pb-2 pt-4">
        {STRETCHES.map(({ name, says, from, until }) => {
          const here = batches.filter((batch) => { const age = daysBetween(batch.madeOn, today); return age >= from && age < until; });
          return (
            <div key={name} className="flex min-w-28 shrink-0 grow flex-col">
              <ul className="flex min-h-20 flex-1 items-end gap-2.5 border-b-5 border-ink">
                {here.map((batch) => {
                  const look = wanted.get(batch.id);
                  const isLate = look !== undefined && look.daysLate > 0 && look.standing !== 'due';
                  return (
                    <li key={batch.id} className={look ? 'translate-y-1.5' : ''}>
                      <Link to={batchAddress(batch.id)} className="grid justify-items-start gap-1 no-underline">
                        <span className={`px-1 text-fine font-[640] tabular-nums ${isLate ? 'bg-ink text-on-ink' : look ? 'bg-wait-fill text-on-wait' : ''}`}>{batch.code.replace(/^.*-/, '')}</span>
                        <Loaf soap={batch.palette} bars={batch.bars ?? 12} isCut={batch.state !== 'in-mould' && batch.state !== 'making'} hasAsh={batch.found.some(({ fault, severity }) => fault === 'soda-ash' && severity > 1)} />
                        <span className="sr-only">{batch.formulaName ?? ''}{look ? `, wants looking at` : ''}</span>
                      </Link>
                    </li>
                  );
                })}
              </ul>
              <p className="pt-2 text-note leading-tight"><b className="font-[640]">{name}</b><br /><span className="text-ink-2">{says}</span></p>
            </div>
          );
        })}
      </div>
    </section>
  );
}
