import type { CauseDetail } from '#shared/causes.ts';
import { Rail } from '#src/components/Rail.tsx';
import { METHOD_WORDS } from '#src/lib/words.ts';

/** The same comparison inside each method and maker, where nothing of the two can play a part. */
export function StrataTable({ cause }: { cause: CauseDetail }) {
  const rows = cause.strata.filter((stratum) => stratum.exposedN + stratum.unexposedN > 0);
  if (rows.length === 0) return null;
  const [one, other] = cause.above === null ? ['with it', 'without'] : ['above the middle', 'below'];
  return (
    <section>
      <Rail heading="By method and maker" aside={cause.differs ? 'they differ from each other' : 'found of looked at'} />
      <div role="region" aria-label="By method and maker" tabIndex={0} className="overflow-x-auto">
        <table className="w-full border-collapse text-row">
          <thead><tr className="text-left text-note text-ink-2"><th scope="col" className="px-1.5 py-1.5 font-[560]">Method, maker</th><th scope="col" className="px-1.5 font-[560]">{one}</th><th scope="col" className="px-1.5 font-[560]">{other}</th></tr></thead>
          <tbody>
            {rows.map((stratum) => (
              <tr key={`${stratum.method} ${stratum.maker}`} className="border-t border-line">
                <th scope="row" className="px-1.5 py-2 text-left font-normal">{METHOD_WORDS[stratum.method]}, {stratum.makerName ?? 'maker not written down'}</th>
                <td className="px-1.5"><Share events={stratum.exposedEvents} n={stratum.exposedN} /></td>
                <td className="px-1.5"><Share events={stratum.unexposedEvents} n={stratum.unexposedN} /></td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}

function Share({ events, n }: { events: number; n: number }) {
  if (n === 0) return <span className="text-ink-3">none made</span>;
  return <span><b>{events}</b> of {n}</span>;
}
