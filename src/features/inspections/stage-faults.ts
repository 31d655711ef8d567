import type { FaultView } from '#shared/faults.ts';
import { familyOf, type Method } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';

export interface StageFault {
  fault: FaultView;
  isMust: boolean;
}

/** Faults that can be judged at a stage of a batch of this method, those that must be answered first. */
export function faultsAtStage(faults: readonly FaultView[], stage: Stage, method: Method): StageFault[] {
  const family = familyOf(method);
  const judged = faults.flatMap((fault) => {
    const answer = fault.checklist.find((line) => line.stage === stage)?.answer ?? 'cannot';
    return answer === 'cannot' || !fault.methodFamilies.includes(family) ? [] : [{ fault, isMust: answer === 'must' }];
  });
  return [...judged.filter(({ isMust }) => isMust), ...judged.filter(({ isMust }) => !isMust)];
}

/** Faults in the order a hand would want them: likely ones of this stage first, the rest as the catalogue has them. */
export function likelyFirst(atStage: readonly StageFault[], likely: readonly { fault: string }[]): FaultView[] {
  const rank = new Map(likely.map(({ fault }, index) => [fault, index]));
  return atStage.map(({ fault }) => fault).sort((a, b) => (rank.get(a.slug) ?? 99) - (rank.get(b.slug) ?? 99));
}
