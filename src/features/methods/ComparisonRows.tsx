import { Link } from 'react-router-dom';
import type { FaultComparison } from '#shared/method-comparison.ts';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Grade } from '#src/components/Grade.tsx';
import { formatNumber } from '#src/lib/format.ts';

const W = 460;
const x = (share: number) => 2 + share * (W - 4);

/** Two intervals a row on one axis, cold open and hot banded, with the difference, the counts and how sure it is. */
export function ComparisonRows({ faults, causeLink }: { faults: readonly FaultComparison[]; causeLink: (fault: string) => string }) {
  return (
    <div role="region" aria-label="Hot against cold, fault by fault" tabIndex={0} className="overflow-x-auto">
      <table className="w-full border-collapse text-row">
        <thead><tr className="text-left text-note text-ink-2"><th scope="col" className="py-2 pr-3 font-[560]">Fault</th><th scope="col" className="font-[560]">0 to 100 of 100 batches, 95 % range</th><th scope="col" className="px-3 font-[560]">hot minus cold, as counted and with the same makers</th><th scope="col" className="px-3 font-[560]">found of looked at</th><th scope="col" className="font-[560]">how sure</th></tr></thead>
        <tbody>
          {faults.map((fault) => (
            <tr key={fault.fault} className="border-t border-line">
              <th scope="row" className="py-2 pr-3 text-left font-[560] whitespace-nowrap"><Link to={causeLink(fault.fault)} className="no-underline hover:underline"><FaultMark fault={fault.fault} name={fault.name} size={24} withName /></Link></th>
              <td><svg viewBox={`0 0 ${W} 34`} className="fill-keeps block h-8.5 w-full min-w-64" preserveAspectRatio="none" aria-hidden="true">
                {[0, 0.25, 0.5, 0.75, 1].map((share) => <path key={share} d={`M${x(share)} 0v34`} className="stroke-line" />)}
                {fault.cold.raw && <><rect x={x(fault.cold.raw.lower)} width={x(fault.cold.raw.upper) - x(fault.cold.raw.lower)} y="4" height="10" className="fill-lift stroke-ink" /><path d={`M${x(fault.cold.raw.share)} 1v16`} className="stroke-ink" strokeWidth="3" /></>}
                {fault.hot.raw && <><rect x={x(fault.hot.raw.lower)} width={x(fault.hot.raw.upper) - x(fault.hot.raw.lower)} y="20" height="10" className="fill-lift stroke-ink" /><path d={`M${x(fault.hot.raw.lower)} 23H${x(fault.hot.raw.upper)}M${x(fault.hot.raw.lower)} 27H${x(fault.hot.raw.upper)}`} className="stroke-ink" /><path d={`M${x(fault.hot.raw.share)} 17v16`} className="stroke-ink" strokeWidth="3" /></>}
              </svg></td>
              <td className="px-3">{difference(fault.difference)}<span className="block text-note text-ink-2">{fault.standardisedDifference ? difference(fault.standardisedDifference) : 'never met: no fair figure'}</span></td>
              <td className="px-3 whitespace-nowrap">cold {fault.cold.events} of {fault.cold.n}<span className="block">hot {fault.hot.events} of {fault.hot.n}</span></td>
              <td className="whitespace-nowrap"><Grade grade={fault.grade} /></td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function difference(given: FaultComparison['difference']): string {
  if (!given) return 'too few';
  const points = (value: number) => `${value > 0 ? '+' : ''}${formatNumber(value * 100)}`;
  return `${points(given.difference)} (${points(given.lower)} to ${points(given.upper)})`;
}
