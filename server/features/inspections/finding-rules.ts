import type { FieldProblem } from '#shared/http/problem.ts';
import type { Method } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';
import { catalogueFault } from '#server/features/faults/catalogue.ts';
import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import { isCatalogueSlug, whyNotAnswerable } from './checklist-answers.ts';

/** What of a finding the rules look at. */
export interface FindingFacts {
  fault: string;
  severity: number;
  bars: number[] | null;
  barsAffected: number | null;
  barsLookedAt: number | null;
}

export interface LookFacts {
  stage: Stage;
  method: Method;
  /** Bars of the batch; null while not counted. */
  bars: number | null;
  barsLookedAt: number | null;
}

/** Bar numbers in order and once each; how many were affected and looked at follow where they can. */
export function completeFinding<F extends FindingFacts>(finding: F, look: Pick<LookFacts, 'barsLookedAt'>): F {
  const bars = finding.bars && finding.bars.length > 0 ? [...new Set(finding.bars)].sort((a, b) => a - b) : null;
  return { ...finding, bars, barsAffected: finding.barsAffected ?? bars?.length ?? null, barsLookedAt: finding.barsLookedAt ?? look.barsLookedAt };
}

/**
 * What is wrong with a finding.
 *
 * @param at pointer to the finding, e.g. `#` or `#/findings/0`
 */
export function problemsOfFinding(finding: FindingFacts, look: LookFacts, at: string): FieldProblem[] {
  const why = whyNotAnswerable(finding.fault, look.stage, look.method);
  if (why || !isCatalogueSlug(finding.fault)) return [{ pointer: `${at}/fault`, detail: why ?? 'There is no such fault' }];
  const { name, severity } = catalogueFault(finding.fault);
  const problems: FieldProblem[] = [];
  const add = (field: string, detail: string) => problems.push({ pointer: `${at}/${field}`, detail });

  if (severity[finding.severity as SeverityGrade] === undefined) {
    const grades = Object.keys(severity);
    add('severity', grades.length === 1 ? `${name} always has severity ${grades[0]}` : `${name} has severity ${grades.join(' or ')} only`);
  }
  const beyond = (finding.bars ?? []).filter((bar) => look.bars !== null && bar > look.bars);
  if (beyond.length > 0) add('bars', `The batch has bars 1 to ${look.bars}; there is no bar ${beyond.join(', ')}`);
  if (look.bars !== null && (finding.barsLookedAt ?? 0) > look.bars) add('barsLookedAt', `Bars looked at must be at most ${look.bars}, the bars of the batch`);
  if (look.bars !== null && (finding.barsAffected ?? 0) > look.bars) add('barsAffected', `Bars affected must be at most ${look.bars}, the bars of the batch`);
  if (finding.barsAffected !== null && finding.barsLookedAt !== null && finding.barsAffected > finding.barsLookedAt) {
    add('barsAffected', `Bars affected must be at most ${finding.barsLookedAt}, the bars looked at`);
  }
  if (finding.bars && finding.barsAffected !== null && finding.bars.length > finding.barsAffected) {
    add('barsAffected', `Bars affected must be at least ${finding.bars.length}, the bars that are named`);
  }
  return problems;
}

/** Whether a finding stops the batch until an owner decides. */
export function isOfSafety(fault: string, severity: number): boolean {
  if (!isCatalogueSlug(fault)) return false;
  const { kind, worsensTo } = catalogueFault(fault);
  return kind === 'safety' || (worsensTo === 'safety' && severity === 3);
}
