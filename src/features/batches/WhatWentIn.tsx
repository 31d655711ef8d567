import type { ReactNode } from 'react';
import type { AnyBatchView } from '#shared/batches.ts';
import { LotTag, STANDING_WORDS } from '#src/components/LotTag.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { useSession } from '#src/features/session/session.queries.ts';
import { formatNumber, formatPercent } from '#src/lib/format.ts';
import { showQuantity, unitSign } from '#src/lib/units.ts';
import { COOK_STAGE_WORDS, COVER_WORDS, GEL_WORDS } from '#src/lib/words.ts';

/** The lines of a batch with their lots, and the measures of its making. Grams only for those who may read formulas. */
export function WhatWentIn({ batch, toLot }: { batch: AnyBatchView; toLot: (lotId: string) => string }) {
  const { account } = useSession();
  return (
    <section className="grid content-start gap-3">
      <Rail heading="What went in" aside={batch.seesQuantities ? 'as weighed' : 'grams: an owner or a maker sees them'} />
      {batch.ingredients.length === 0 ? (
        <p className="text-ink-2">No line is written down.</p>
      ) : (
        <table className="w-full border-collapse text-row">
          <thead>
            <tr className="text-note text-ink-2">
              <th scope="col" className="pb-1 text-left font-[560]">line</th>
              {batch.seesQuantities && <><th scope="col" className="pb-1 text-right font-[560]">of oils</th><th scope="col" className="pb-1 text-right font-[560]">{unitSign('mass', account).replace(' by weight', '')}</th></>}
              <th scope="col" className="pb-1 pl-4 text-left font-[560]">lot</th>
            </tr>
          </thead>
          <tbody>
            {(batch.seesQuantities ? batch.ingredients : batch.ingredients.map((line) => ({ ...line, massG: null, shareOfOilsFraction: null }))).map((line) => (
              <tr key={line.id} className="border-t border-line">
                <th scope="row" className="py-2 pr-2 text-left font-[440]">{line.materialName}</th>
                {batch.seesQuantities && (
                  <>
                    <td className="text-right tabular-nums">{line.shareOfOilsFraction === null ? '' : formatPercent(line.shareOfOilsFraction)}</td>
                    <td className="pl-2 text-right tabular-nums">{line.massG === null ? '' : showQuantity(line.massG, 'mass', account, account.massUnit === 'gram' ? 0 : 2).replace(/\u202F\D+$/, '')}</td>
                  </>
                )}
                <td className="py-1 pl-4">
                  {line.lotId === null ? <span className="text-ink-3">not known</span> : line.kind === 'fragrance' ? (
                    <LotTag code={line.lotCode ?? ''} standing={line.lotStanding ?? 'in-use'} to={toLot(line.lotId)} />
                  ) : (
                    <>{line.lotCode}{line.lotStanding === 'on-hold' && <span className="text-note text-ink-2">, {STANDING_WORDS['on-hold']}</span>}</>
                  )}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <Measures batch={batch} />
    </section>
  );
}

function Measures({ batch }: { batch: AnyBatchView }) {
  const { account } = useSession();
  const temperature = (value: number | null) => (value === null ? null : showQuantity(value, 'temperature', account, 0));
  const joined = (parts: (string | null)[]) => parts.filter((part) => part !== null).join(' · ') || null;
  const number = (value: number | null, sign: string, decimals = 0) => (value === null ? null : `${formatNumber(value, decimals)}\u202F${sign}`);
  const percent = (value: number | null) => (value === null ? null : formatPercent(value));
  const rows: [string, ReactNode][] = [
    ['Water to lye', batch.waterToLye === null ? null : formatNumber(batch.waterToLye, 2)],
    ['Lye concentration', percent(batch.lyeConcentrationFraction)],
    ['Superfat, planned', percent(batch.superfatFraction)],
    ['Superfat, as weighed', percent(batch.superfatWeighedFraction)],
    ['Fragrance, of the oils', percent(batch.fragranceFraction)],
    ['Oils, lye', joined([temperature(batch.oilTemperatureC), temperature(batch.lyeTemperatureC)])],
    ['Batter, when the scent went in', joined([temperature(batch.batterTemperatureC), temperature(batch.scentTemperatureC)])],
    ['Room', joined([temperature(batch.roomTemperatureC), batch.humidityFraction === null ? null : formatPercent(batch.humidityFraction, 0)])],
    ['Blended', number(batch.blendSeconds, 's')],
    ['Trace to pour', number(batch.minutesToPour, 'min')],
    ['Cook', joined([temperature(batch.cookTemperatureC), number(batch.cookMinutes, 'min'), batch.cookLossFraction === null ? null : `${formatPercent(batch.cookLossFraction)} lost`])],
    ['Cook stages', batch.cookStages.map(({ stage, minutesFromStart }) => `${COOK_STAGE_WORDS[stage]} ${minutesFromStart} min`).join(' · ') || null],
    ['Gel', batch.gel && GEL_WORDS[batch.gel]],
    ['Covered', joined([batch.cover && COVER_WORDS[batch.cover], batch.isSprayed ? 'sprayed' : null])],
    ['In the mould, to the cut', joined([number(batch.mouldHours, 'h'), number(batch.cutHours, 'h')])],
  ];
  const isHot = batch.family === 'hot';
  const known = rows.filter(([, value]) => value !== null);
  const missing = rows.filter(([label, value]) => value === null && (isHot || !label.startsWith('Cook'))).map(([label]) => label.toLowerCase());
  return (
    <>
      <dl className="grid">
        {known.map(([label, value]) => (
          <div key={label} className="flex items-baseline justify-between gap-4 py-1">
            <dt className="text-row">{label}</dt>
            <dd className="gauge text-right text-gauge-s">{value}</dd>
          </div>
        ))}
      </dl>
      {missing.length > 0 && <p className="text-note text-ink-2">Not recorded: {missing.join(', ')}.</p>}
    </>
  );
}
