import type { LotBehaviourView, LotFaultRate } from '#shared/lot-behaviour.ts';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Strip, type Piece } from '#src/components/Strip.tsx';
import { formatNumber } from '#src/lib/format.ts';

const MOST = 6;

/** The faults that speak: those found, loudest first. */
function speaking(faults: readonly LotFaultRate[]): LotFaultRate[] {
  return faults.filter(({ all }) => all.events > 0).sort((a, b) => (b.all.chanceTwice ?? 0) - (a.all.chanceTwice ?? 0)).slice(0, MOST);
}

/** Cold and hot batches side by side, a piece for each batch, oldest left. */
export function LotStrips({ behaviour }: { behaviour: LotBehaviourView }) {
  const faults = speaking(behaviour.faults);
  if (faults.length === 0) return <p className="bg-tray px-4 py-3 text-ink-2">{behaviour.n === 0 ? 'No batch holds this lot yet.' : `Nothing was found in its ${behaviour.n} batches so far.`}</p>;
  return (
    <div className="grid bg-tray bench:grid-cols-2 bench:divide-x-2 bench:divide-ink">
      {(['cold', 'hot'] as const).map((family) => {
        const own = behaviour.batches.filter((batch) => batch.family === family && batch.counts);
        return (
          <section key={family} className="min-w-0 px-4 py-3">
            <Rail level={3} heading={`${family === 'cold' ? 'Cold' : 'Hot'}, ${own.length} batches`} aside="one piece a batch, oldest left" />
            {faults.map((fault) => (
              <div key={fault.fault} className="grid grid-cols-[9.5rem_minmax(0,1fr)_auto] items-center gap-x-2 border-b border-line py-1.5 text-row">
                <FaultMark fault={fault.fault} name={fault.name} withName />
                <Strip width={own.length > 20 ? 7 : 13} height={18} label={`${fault[family].events} of ${fault[family].n} found`} pieces={own.map((batch): Piece => {
                  const found = batch.found.find((one) => one.fault === fault.fault);
                  return found ? { kind: 'found', severity: found.severity } : batch.clear.includes(fault.fault) ? { kind: 'clear' } : { kind: 'not-checked' };
                })} />
                <span><b className="gauge text-gauge-s">{fault[family].events}</b> of {fault[family].n}</span>
              </div>
            ))}
          </section>
        );
      })}
    </div>
  );
}

const W = 620;
const at = (share: number) => 130 + share * (W - 150);

/** Raw, shrunk and expected of each fault on one axis. */
export function LotAgainstPeers({ behaviour }: { behaviour: LotBehaviourView }) {
  const faults = speaking(behaviour.faults).filter(({ all }) => all.shownRate !== null && all.ratio && all.expectedRate !== null);
  if (faults.length === 0) return null;
  const foot = faults.length * 52 + 8;
  return (
    <section>
      <Rail heading="Against what was to be expected" aside={`peers: ${behaviour.peers} other lots`} />
      <svg viewBox={`0 0 ${W} ${foot + 38}`} className="fill-keeps mt-2 block w-full" role="img" aria-label={faults.map(({ name, all }) => `${name}: ${all.events} of ${all.n} found, shrunk ${formatNumber((all.shownRate ?? 0) * 100)} of 100, expected ${formatNumber((all.expectedRate ?? 0) * 100)}`).join('; ')}>
        {[0, 0.25, 0.5, 0.75, 1].map((share) => <g key={share}><path d={`M${at(share)} 4V${foot}`} className="stroke-line" /><text x={at(share)} y={foot + 16} textAnchor="middle" className="fill-ink-2 text-note">{share * 100}</text></g>)}
        <text x={W - 8} y={foot + 34} textAnchor="end" className="fill-ink-2 text-note">of 100 batches</text>
        {faults.map(({ fault, name, all }, row) => {
          const y = row * 52 + 32;
          const expected = all.expectedRate ?? 0;
          const end = (times: number) => at(Math.min(1, expected * times));
          return (
            <g key={fault}>
              <text x="0" y={y + 5} className="fill-ink text-row font-[560]">{name}</text>
              <path d={`M${at(expected)} ${y - 15}v30`} className="stroke-ink" strokeWidth="2" /><text x={at(expected) + 3} y={y - 16} className="fill-ink-2 text-fine">expected {formatNumber(expected * 100)}</text>
              {all.ratio && <path d={`M${end(all.ratio.lower)} ${y}H${end(all.ratio.upper)}`} className="stroke-more-fill" strokeWidth="4" />}
              <rect x={at(all.shownRate ?? 0) - 4} y={y - 6} width="8" height="12" className="fill-more" />
              <path d={`M${at(all.rate?.share ?? 0)} ${y - 12}v24`} className="stroke-ink" strokeWidth="1.5" strokeDasharray="2 2" />
              <text x={at(all.rate?.share ?? 0) + 4} y={y + 20} className="fill-ink-2 text-fine">raw {all.events}/{all.n}</text>
            </g>
          );
        })}
      </svg>
      <p className="text-note text-ink-2">Shrunk: pulled toward its peers as far as {behaviour.n} batches deserve. Chance that the lot is at least twice as bad: {faults.map(({ name, all }) => `${name.toLowerCase()} ${formatNumber((all.chanceTwice ?? 0) * 100)} in 100`).join(', ')}.</p>
    </section>
  );
}
