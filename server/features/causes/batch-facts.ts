import type { BatchRow, Outcome } from '#analysis/causes/board-rows.ts';
import { familyOf, type Method } from '#shared/words/methods.ts';

/** One batch as the statement reads it: plain values, small enough to hand to another thread by the thousand. */
export interface BatchFacts {
  id: string;
  code: string;
  madeOn: string;
  method: Method;
  state: string;
  formula: string | null;
  maker: string | null;
  mould: string | null;
  cover: string | null;
  gel: string | null;
  trace: string | null;
  isSprayed: boolean | null;
  hasEmbeds: boolean;
  waterToLye: number | null;
  superfat: number | null;
  oilTemperatureC: number | null;
  lyeTemperatureC: number | null;
  scentTemperatureC: number | null;
  roomTemperatureC: number | null;
  humidity: number | null;
  blendSeconds: number | null;
  cookMinutes: number | null;
  mouldHours: number | null;
  cutHours: number | null;
  fragrance: number | null;
  /** Share of the oils; null when a scent lot's vanillin or load is not known. */
  vanillin: number | null;
  hasLines: boolean;
  fragranceLots: string[] | null;
  hasFragrance: boolean;
  fatLots: string[] | null;
  alkaliLots: string[] | null;
  colourantLots: string[] | null;
  colourants: string[] | null;
  additives: string[] | null;
  liquids: string[] | null;
  /** Severity found, 0 clear; what is absent was not looked at. */
  outcomes: Record<string, Outcome>;
}

const SEASONS = ['dec-feb', 'mar-may', 'jun-aug', 'sep-nov'] as const;

/** Quarter of the year a day lies in; named by its months, which are true on both halves of the earth. */
export function seasonOf(day: string): (typeof SEASONS)[number] {
  return SEASONS[Math.floor((Number(day.slice(5, 7)) % 12) / 3)] ?? 'dec-feb';
}

/**
 * Why the analysis does not count a batch; rebatch it leaves out by itself. A batch given up counts for what was
 * answered about it: leaving out those that seized in the pot would acquit the lot that did it.
 */
function leftOut({ state, outcomes }: BatchFacts): string | undefined {
  if (state === 'planned') return 'not-made-yet';
  if (Object.keys(outcomes).length > 0) return undefined;
  return state === 'abandoned' ? 'abandoned' : state === 'making' ? 'not-made-yet' : undefined;
}

/** A share as per cent, without the dust of binary fractions. */
const percent = (share: number | null) => (share === null ? null : Math.round(share * 1e8) / 1e6);

/** The batch as the analysis sees it. What was not recorded is absent; what was not looked at has no outcome. */
export function analysisRow(facts: BatchFacts): BatchRow {
  const family = familyOf(facts.method);
  const reason = leftOut(facts);
  return {
    id: facts.id,
    method: facts.method,
    family,
    ...(reason ? { leftOut: reason } : {}),
    nominal: known({
      formula: facts.formula, maker: facts.maker, mould: facts.mould, cover: facts.cover, trace: facts.trace,
      gel: facts.gel === 'not-seen' ? null : facts.gel,
      spray: facts.isSprayed === null ? null : facts.isSprayed ? 'yes' : 'no',
      embeds: facts.hasEmbeds ? 'yes' : 'no',
      season: seasonOf(facts.madeOn),
    }),
    numbers: known({
      waterToLye: facts.waterToLye, superfatPct: percent(facts.superfat), oilTemperatureC: facts.oilTemperatureC, lyeTemperatureC: facts.lyeTemperatureC,
      // In a cold batch the scent goes in at the batter's warmth, which the oils' says already.
      scentTemperatureC: family === 'hot' ? facts.scentTemperatureC : null,
      roomTemperatureC: facts.roomTemperatureC, humidityPct: percent(facts.humidity), blendSeconds: facts.blendSeconds, cookMinutes: facts.cookMinutes,
      mouldHours: facts.mouldHours, cutHours: facts.cutHours, fragrancePct: percent(facts.fragrance), vanillinPct: percent(facts.vanillin),
    }),
    holds: known({
      // A scented batch whose lot nobody wrote down is not a batch without that lot.
      fragranceLot: facts.fragranceLots ?? (facts.hasLines && !facts.hasFragrance ? [] : null),
      fatLot: facts.fatLots, alkaliLot: facts.alkaliLots,
      colourantLot: facts.colourantLots ?? (facts.hasLines && facts.colourants === null ? [] : null),
      colourant: facts.colourants ?? (facts.hasLines ? [] : null),
      additive: facts.additives ?? (facts.hasLines ? [] : null),
      liquid: facts.liquids,
    }),
    outcomes: facts.outcomes,
  };
}

function known<Value>(values: Record<string, Value | null>): Record<string, Value> {
  return Object.fromEntries(Object.entries(values).filter((entry): entry is [string, Value] => entry[1] !== null));
}
