import type { BatchRow, Board } from '#analysis/causes/board-rows.ts';
import { causesBoard } from '#analysis/causes/board.ts';
import { isExposed } from '#analysis/causes/exposure.ts';
import { oneCause, type CauseDetail } from '#analysis/causes/one-cause.ts';
import { lotsBehaviour, type LotBehaviour } from '#analysis/lots/behaviour.ts';
import { compareMethods, type MethodComparison } from '#analysis/methods/compare.ts';
import type { BatchBehind } from '#shared/causes.ts';
import type { LotBatch } from '#shared/lot-behaviour.ts';
import { familyOf } from '#shared/words/methods.ts';
import { analysisRow, type BatchFacts } from './batch-facts.ts';
import { BOARD_FAULTS } from './board-faults.ts';
import { BOARD_INPUTS, inputOf } from './board-inputs.ts';
import { canBeSeenBy } from './can-be-seen.ts';

export interface FaultCount { fault: string; checked: number; found: number; notChecked: number; notYet: number }

export interface BoardAnswer {
  board: Board;
  faults: FaultCount[];
  firstMadeOn: string | null;
  lastMadeOn: string | null;
  /** Levels of every input that a counting batch has. */
  levels: Record<string, string[]>;
}

/** A question about the batches of one bench; each is answered once and kept by the pool. */
export type Question =
  | { ask: 'board' }
  | { ask: 'cause'; fault: string; input: string; level: string | null }
  | { ask: 'behind'; fault: string; input: string; level: string | null; group?: 'exposed' | 'unexposed'; outcome?: BatchBehind['outcome'] }
  | { ask: 'lots'; input: string }
  | { ask: 'batches-of-lot'; input: string; lot: string }
  | { ask: 'methods' };

export interface AnswerTo {
  board: BoardAnswer;
  cause: CauseDetail | null;
  behind: { items: BatchBehind[]; total: number };
  lots: LotBehaviour[];
  'batches-of-lot': LotBatch[];
  methods: { comparison: MethodComparison; onlyIn: { input: string; level: string; family: 'hot' | 'cold'; batches: number }[] };
}

const MOST_BEHIND = 1000;
/** So few batches of one family only say nothing about where families never met. */
const LEAST_ONLY_IN = 5;

/** All batches of one workshop under one filter, laid out once; every answer about them comes from here. */
export class AnswerBench {
  private readonly facts: BatchFacts[] = [];
  private readonly rows: BatchRow[] = [];
  private board: BoardAnswer | undefined;

  constructor(private readonly today: string) {}

  add(facts: readonly BatchFacts[]): void {
    for (const one of facts) {
      this.facts.push(one);
      this.rows.push(analysisRow(one));
    }
  }

  answer(question: Question): AnswerTo[Question['ask']] {
    switch (question.ask) {
      case 'board':
        return this.wholeBoard();
      case 'cause':
        return oneCause(this.question(), question, this.wholeBoard().board.cells);
      case 'behind':
        return this.behind(question);
      case 'lots':
        return lotsBehaviour({ rows: this.rows, lotInput: question.input, faults: BOARD_FAULTS.map((fault) => fault.slug), cells: this.wholeBoard().board.cells });
      case 'batches-of-lot':
        return this.batchesOfLot(question.input, question.lot);
      case 'methods':
        return { comparison: compareMethods({ rows: this.rows, faults: BOARD_FAULTS.map((fault) => fault.slug), cells: this.wholeBoard().board.cells }), onlyIn: this.onlyIn() };
    }
  }

  private question() {
    return { rows: this.rows, inputs: BOARD_INPUTS, faults: BOARD_FAULTS };
  }

  private wholeBoard(): BoardAnswer {
    this.board ??= this.makeBoard();
    return this.board;
  }

  private makeBoard(): BoardAnswer {
    const board = causesBoard(this.question());
    const counting = this.counting();
    const days = counting.map(({ facts }) => facts.madeOn).sort();
    return {
      board, faults: BOARD_FAULTS.map((fault) => this.countOf(fault.slug, fault.firstSeen, counting)),
      firstMadeOn: days[0] ?? null, lastMadeOn: days.at(-1) ?? null, levels: levelsOf(board, counting.map(({ row }) => row)),
    };
  }

  private counting(): { facts: BatchFacts; row: BatchRow }[] {
    return this.rows.flatMap((row, i) => (row.leftOut === undefined && row.family !== 'rebatch' ? [{ facts: this.facts[i]!, row }] : []));
  }

  private countOf(fault: string, firstSeen: string, counting: readonly { facts: BatchFacts; row: BatchRow }[]): FaultCount {
    const count: FaultCount = { fault, checked: 0, found: 0, notChecked: 0, notYet: 0 };
    for (const { facts, row } of counting) {
      const outcome = row.outcomes[fault];
      if (outcome !== undefined) {
        count.checked++;
        if (outcome > 0) count.found++;
      } else if (canBeSeenBy(this.today, facts, firstSeen)) count.notChecked++;
      else count.notYet++;
    }
    return count;
  }

  private behind({ fault, input, level, group, outcome }: Extract<Question, { ask: 'behind' }>): AnswerTo['behind'] {
    const spec = inputOf(input)!;
    const firstSeen = BOARD_FAULTS.find((one) => one.slug === fault)!.firstSeen;
    const above = spec.kind === 'number' ? (oneCause(this.question(), { fault, input, level }, this.wholeBoard().board.cells)?.above ?? Infinity) : undefined;
    const all = this.counting().map(({ facts, row }): BatchBehind => {
      const severity = row.outcomes[fault];
      const exposed = spec.kind !== 'number' && level === null ? null : isExposed(row, spec, level, above);
      return {
        id: facts.id, code: facts.code, madeOn: facts.madeOn, method: facts.method, family: familyOf(facts.method),
        outcome: severity === undefined ? (canBeSeenBy(this.today, facts, firstSeen) ? 'not-checked' : 'not-yet') : severity > 0 ? 'found' : 'clear',
        severity: severity ?? null, group: exposed === null ? null : exposed ? 'exposed' : 'unexposed',
        value: spec.kind === 'number' ? (row.numbers[input] ?? null) : null,
      };
    });
    const asked = all.filter((one) => (group === undefined || one.group === group) && (outcome === undefined || one.outcome === outcome));
    asked.sort((a, b) => (a.madeOn < b.madeOn ? 1 : a.madeOn > b.madeOn ? -1 : a.code < b.code ? 1 : -1));
    return { items: asked.slice(0, MOST_BEHIND), total: asked.length };
  }

  private batchesOfLot(input: string, lot: string): LotBatch[] {
    const own = this.rows.flatMap((row, i) => (row.holds[input]?.includes(lot) ? [{ row, facts: this.facts[i]! }] : []));
    own.sort((a, b) => (a.facts.madeOn < b.facts.madeOn ? -1 : a.facts.madeOn > b.facts.madeOn ? 1 : a.facts.code < b.facts.code ? -1 : 1));
    return own.slice(-MOST_BEHIND).map(({ row, facts }) => {
      const answered = Object.entries(row.outcomes);
      const found = answered.filter(([, severity]) => severity > 0).map(([fault, severity]) => ({ fault, severity }));
      found.sort((a, b) => b.severity - a.severity || (a.fault < b.fault ? -1 : 1));
      return {
        id: facts.id, code: facts.code, madeOn: facts.madeOn, family: row.family, counts: row.leftOut === undefined && row.family !== 'rebatch',
        found, clear: answered.filter(([, severity]) => severity === 0).map(([fault]) => fault).sort(),
      };
    });
  }

  /** Lots, formulas and makers that were made in one family only. */
  private onlyIn(): AnswerTo['methods']['onlyIn'] {
    return ['fragranceLot', 'formula', 'maker'].flatMap((input) => {
      const spec = inputOf(input)!;
      const counts = new Map<string, { hot: number; cold: number }>();
      for (const { row } of this.counting()) {
        for (const level of spec.kind === 'held' ? (row.holds[input] ?? []) : [row.nominal[input] ?? ''].filter(Boolean)) {
          const own = counts.get(level) ?? { hot: 0, cold: 0 };
          own[row.family === 'hot' ? 'hot' : 'cold']++;
          counts.set(level, own);
        }
      }
      return [...counts].filter(([, { hot, cold }]) => Math.min(hot, cold) === 0 && hot + cold >= LEAST_ONLY_IN)
        .map(([level, { hot, cold }]) => ({ input, level, family: hot > 0 ? ('hot' as const) : ('cold' as const), batches: hot + cold }))
        .sort((a, b) => b.batches - a.batches || (a.level < b.level ? -1 : 1));
    });
  }
}

function levelsOf(board: Board, rows: readonly BatchRow[]): Record<string, string[]> {
  return Object.fromEntries(board.inputs.map((slug) => {
    const spec = inputOf(slug)!;
    if (spec.kind === 'number') return [slug, []];
    const seen = new Set(board.cells.flatMap((cell) => (cell.input === slug && cell.level !== null ? [cell.level] : [])));
    for (const row of rows) {
      const own = spec.kind === 'held' ? (row.holds[slug] ?? []) : [slug === 'method' ? row.method : slug === 'methodFamily' ? row.family : row.nominal[slug]];
      for (const level of own) if (level !== undefined) seen.add(level);
    }
    return [slug, [...seen].sort()];
  }));
}
