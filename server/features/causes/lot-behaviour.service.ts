import { LOT_VERDICTS, type LotBehaviour, type LotRate as RateOf } from '#analysis/lots/behaviour.ts';
import type { BehavingKind, LotBehaviourRow, LotBehaviourView, LotFaultRate, LotRate } from '#shared/lot-behaviour.ts';
import type { Work } from '#server/http/api.ts';
import { notFound } from '#server/problem.ts';
import type { AnswerPool } from './answer-pool.ts';
import { withAnswers } from './answers.read.ts';
import { BOARD_FAULTS } from './board-faults.ts';
import { LOT_INPUTS } from './board-inputs.ts';
import type { LotName, Names } from './names.read.ts';

const faultNames = new Map(BOARD_FAULTS.map(({ slug, name }) => [slug, name]));
const NO_RATE: LotRate = { n: 0, events: 0, notChecked: 0, rate: null, expected: 0, expectedRate: null, ratio: null, chanceTwice: null, shownRate: null, verdict: 'too-few' };

/** How the lots of a kind behave, the gravest first; a lot no batch holds yet stands last with nothing counted. */
export async function readLotsBehaviour(pool: AnswerPool, work: Work, kind: BehavingKind) {
  return withAnswers(pool, work, {}, async (answers) => {
    const { answer } = await answers.ask({ ask: 'lots', input: LOT_INPUTS[kind] });
    const items = answer.flatMap((behaviour): LotBehaviourRow[] => {
      const lot = answers.names.lots.get(behaviour.lot);
      return lot ? [{ ...headOf(lot, behaviour), worst: worstOf(behaviour) }] : [];
    });
    const chance = (row: LotBehaviourRow) => row.worst?.all.chanceTwice ?? 0;
    items.sort((a, b) => LOT_VERDICTS.indexOf(a.verdict) - LOT_VERDICTS.indexOf(b.verdict) || chance(b) - chance(a) || (a.code < b.code ? -1 : 1));
    return { generatedFrom: answers.generatedFrom, kind, items };
  });
}

/** One lot against its peers, with the batches that hold it. @throws Problem 404 */
export async function readLotBehaviour(pool: AnswerPool, work: Work, lotId: string): Promise<LotBehaviourView> {
  const kind = await work(async (tx) => (await tx.row<{ kind: string }>('select m.kind from lot l join material m on m.workshop_id = l.workshop_id and m.id = l.material_id where l.id = $1', [lotId]))?.kind);
  if (kind === undefined) throw notFound('lot');
  return withAnswers(pool, work, {}, async (answers) => {
    const lot = answers.names.lots.get(lotId);
    if (!lot) throw notFound('lot');
    const input = (LOT_INPUTS as Record<string, string | undefined>)[kind];
    // Packaging, liquids and additives are not inputs of the board as lots: nothing is said of them.
    const all = input ? (await answers.ask({ ask: 'lots', input })).answer : [];
    const batches = input ? (await answers.ask({ ask: 'batches-of-lot', input, lot: lotId })).answer : [];
    const own = all.find((behaviour) => behaviour.lot === lotId) ?? nothingYet(lotId);
    return {
      ...headOf(lot, own), generatedFrom: answers.generatedFrom, peers: all.filter((behaviour) => behaviour.lot !== lotId).length,
      faults: own.faults.map(faultRate), sameMaterial: sameMaterial(answers.names, lot, all), batches,
    };
  });
}

function nothingYet(lot: string): LotBehaviour {
  return { lot, n: 0, families: { cold: { batches: 0 }, hot: { batches: 0 } }, leftOut: [], faults: [], verdict: 'too-few', suggestedStanding: null, because: [], method: 'gamma-poisson' };
}

function headOf({ id, code, materialName, standing }: LotName, { n, families, verdict, suggestedStanding, because, leftOut, method }: LotBehaviour) {
  return {
    lotId: id, code, materialName, standing, n, coldBatches: families.cold.batches, hotBatches: families.hot.batches,
    verdict, suggestedStanding, because: [...because], leftOut: leftOut.map(({ reason, count }) => ({ reason, count })), method,
  };
}

function faultRate({ fault, verdict, all, cold, hot, boardGrade }: LotBehaviour['faults'][number]): LotFaultRate {
  const rate = (one: RateOf): LotRate => ({ ...NO_RATE, ...one });
  return { fault, name: faultNames.get(fault) ?? fault, verdict, all: rate(all), cold: rate(cold), hot: rate(hot), boardGrade };
}

/** The fault that speaks loudest: the gravest verdict, then the best-founded suspicion; none while nothing was found. */
function worstOf({ faults }: LotBehaviour): LotFaultRate | null {
  const found = faults.filter(({ all }) => all.events > 0).map(faultRate);
  found.sort((a, b) => LOT_VERDICTS.indexOf(a.verdict) - LOT_VERDICTS.indexOf(b.verdict) || (b.all.chanceTwice ?? 0) - (a.all.chanceTwice ?? 0) || b.all.events - a.all.events);
  return found[0] ?? null;
}

function sameMaterial({ lots }: Names, lot: LotName, all: readonly LotBehaviour[]): LotBehaviourView['sameMaterial'] {
  return all.flatMap(({ lot: lotId, verdict, n }) => {
    const other = lots.get(lotId);
    return other && other.materialId === lot.materialId && lotId !== lot.id ? [{ lotId, code: other.code, verdict, n }] : [];
  });
}
