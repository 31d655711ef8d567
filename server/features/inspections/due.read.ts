import type { DueInspection } from '#shared/inspections.ts';
import type { BatchState, Palette } from '#shared/words/batch-words.ts';
import type { Method } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';
import { dayIn } from '#shared/units/zones.ts';
import { checklistFor } from '#server/features/faults/checklist.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { timeZoneOf } from './batch-under-look.ts';
import { dueLooks } from './due.ts';

/** Share of oils that spoil soon from which on spots come often enough to look in week 6 too. */
const LINOLEIC_RICH = 0.15;
/** A workshop of twelve people has some sixty batches under way; this many is a log that nobody closes. */
const MOST_BATCHES = 1_000;

interface Row {
  id: string;
  code: string;
  palette: Palette | null;
  bars: number | null;
  formulaName: string | null;
  method: Method;
  state: BatchState;
  madeOn: string;
  unmouldedOn: string | null;
  cutOn: string | null;
  linoleicFraction: number;
  looked: Stage[];
}

const UNDER_WAY = `
  select b.id, b.code, b.palette, b.bars, f.name "formulaName", b.method, b.state, b.made_on::text "madeOn", b.unmoulded_on::text "unmouldedOn", b.cut_on::text "cutOn",
    coalesce(
      (select sum(i.share_of_oils_fraction) from batch_ingredient i join material t on t.workshop_id = i.workshop_id and t.id = i.material_id
        where i.workshop_id = b.workshop_id and i.batch_id = b.id and t.is_linoleic_rich and t.kind = 'fat'),
      (select sum(l.share_of_oils_fraction) from formula_line l join material t on t.workshop_id = l.workshop_id and t.id = l.material_id
        where l.workshop_id = b.workshop_id and l.formula_version_id = b.formula_version_id and t.is_linoleic_rich and t.kind = 'fat'),
      0) "linoleicFraction",
    array(select distinct i.stage from inspection i where i.workshop_id = b.workshop_id and i.batch_id = b.id) looked
  from batch b left join formula f on f.workshop_id = b.workshop_id and f.id = b.formula_id
  where b.state in ('making', 'in-mould', 'curing', 'cured')
  order by b.made_on desc, b.id desc limit $1`;

const URGENCY = ['overdue', 'late', 'due', 'coming'] as const;

/**
 * What wants looking at, the most urgent first.
 *
 * @param on another day than today, YYYY-MM-DD in the workshop's zone
 */
export async function listDue(tx: WorkshopTransaction, on?: string): Promise<{ items: DueInspection[] }> {
  const today = on ?? dayIn(await timeZoneOf(tx), tx.now);
  const batches = await tx.rows<Row>(UNDER_WAY, [MOST_BATCHES]);
  const items = batches.flatMap((batch) =>
    dueLooks({ ...batch, unmouldedOn: batch.unmouldedOn ?? undefined, cutOn: batch.cutOn ?? undefined, linoleicRich: batch.linoleicFraction > LINOLEIC_RICH }, today).map((look): DueInspection => ({
      batchId: batch.id, batchCode: batch.code, palette: batch.palette, bars: batch.bars, formulaName: batch.formulaName, ...look,
      mustAnswer: checklistFor(look.stage, batch.method).filter(({ answer }) => answer === 'must').map(({ fault }) => fault),
    })),
  );
  items.sort((a, b) => URGENCY.indexOf(a.standing) - URGENCY.indexOf(b.standing) || (a.dueOn < b.dueOn ? -1 : a.dueOn > b.dueOn ? 1 : a.batchCode < b.batchCode ? -1 : 1));
  return { items };
}
