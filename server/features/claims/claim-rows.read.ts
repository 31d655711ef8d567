import { CURE_LOSS } from '#shared/fragrance-allowance.ts';
import { CLAIM_COLUMNS, type ClaimColumn } from '#shared/claims.ts';
import { familyOf, type Method } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';
import type { WorkshopTransaction } from '#server/db/workshop-transaction.ts';
import { catalogueFault, type CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { Cell } from '#server/http/csv.ts';
import { cannotBeSeenYet } from './not-yet.ts';

/** What of a claim the rows are read by. */
export interface ClaimChoice {
  number: number;
  lotIds: string[];
  faults: string[];
  from: string | null;
  to: string | null;
  leaveOut: string[];
  remarks: string | null;
}

export interface ClaimRow {
  supplier: string | null;
  fragrance: string;
  productNumber: string | null;
  lot: string;
  receivedOn: string | null;
  openedOn: string | null;
  bestBeforeOn: string | null;
  batch: string;
  madeOn: string;
  method: Method;
  superfat: number | null;
  concentration: number | null;
  oilC: number | null;
  lyeC: number | null;
  scentC: number | null;
  load: number | null;
  lotShare: number | null;
  hardShare: number | null;
  lauricShare: number | null;
  hasAnimalFat: boolean;
  hasColourant: boolean;
  additives: string[];
  chargedG: number | null;
  scentG: number | null;
  cookLoss: number | null;
  fault: string;
  severity: number | null;
  stage: Stage | null;
  seenOn: string | null;
  barsAffected: number | null;
  barsLookedAt: number | null;
  photos: string[];
}

/** Rows fetched at once. */
const PAGE = 500;

/**
 * One row per batch that holds a chosen lot and per chosen fault, the good ones included.
 * Of the formula only its class leaves: shares of fats in steps, kinds of additives, no grams.
 */
const ROWS_SQL = `
  select s.name supplier, m.name fragrance, l.supplier_product_number "productNumber", l.code lot, l.received_on::text "receivedOn", l.opened_on::text "openedOn", l.best_before_on::text "bestBeforeOn",
    b.code batch, b.made_on::text "madeOn", b.method, coalesce(b.superfat_weighed_fraction, b.superfat_fraction) superfat, b.lye_concentration_fraction concentration,
    b.oil_temperature_c "oilC", b.lye_temperature_c "lyeC", b.scent_temperature_c "scentC", b.fragrance_fraction load, b.cook_loss_fraction "cookLoss",
    held.share / nullif(b.fragrance_fraction, 0) "lotShare", w."hardShare", w."lauricShare", w."hasAnimalFat", w."hasColourant", w.additives, w."chargedG", w."scentG",
    f.fault, (o.outcomes ->> f.fault)::int severity, seen.stage, seen.seen_on "seenOn", worst.bars_affected "barsAffected", worst.bars_looked_at "barsLookedAt",
    coalesce((select array_agg(distinct b.code || ' ' || coalesce(p.stage, 'photo') || ' ' || left(p.id::text, 13)) from mark k
      join finding g on g.workshop_id = k.workshop_id and g.id = k.finding_id and g.withdrawn_at is null
      join photo p on p.workshop_id = k.workshop_id and p.id = k.photo_id
      where k.workshop_id = b.workshop_id and g.batch_id = b.id and g.fault = f.fault), '{}') photos
  from (
    select i.workshop_id, i.batch_id, i.lot_id, sum(coalesce(i.share_of_oils_fraction, i.mass_g / nullif(c.oil_mass_g, 0))) share
    from batch_ingredient i join batch c on c.workshop_id = i.workshop_id and c.id = i.batch_id
    where i.lot_id = any($1::uuid[]) group by 1, 2, 3
  ) held
  join batch b on b.workshop_id = held.workshop_id and b.id = held.batch_id and b.state <> 'planned'
    and ($3::date is null or b.made_on >= $3) and ($4::date is null or b.made_on <= $4)
  join lot l on l.workshop_id = held.workshop_id and l.id = held.lot_id
  join material m on m.workshop_id = l.workshop_id and m.id = l.material_id
  left join supplier s on s.workshop_id = l.workshop_id and s.id = l.supplier_id
  left join batch_outcome o on o.workshop_id = b.workshop_id and o.batch_id = b.id
  cross join lateral (
    select sum(fat) filter (where t.is_hard_fat) / nullif(sum(fat), 0) "hardShare", sum(fat) filter (where t.is_lauric) / nullif(sum(fat), 0) "lauricShare",
      coalesce(bool_or(t.is_animal and t.kind = 'fat'), false) "hasAnimalFat", bool_or(t.kind = 'colourant') "hasColourant",
      coalesce(array_agg(distinct t.name) filter (where t.kind in ('additive', 'liquid')), '{}') additives,
      case when bool_and(i.mass_g is not null) then sum(i.mass_g) end "chargedG", sum(i.mass_g) filter (where t.kind = 'fragrance') "scentG"
    from batch_ingredient i join material t on t.workshop_id = i.workshop_id and t.id = i.material_id
      cross join lateral (select case when t.kind = 'fat' then coalesce(i.mass_g, i.share_of_oils_fraction * b.oil_mass_g, i.share_of_oils_fraction) end fat) part
    where i.workshop_id = b.workshop_id and i.batch_id = b.id
  ) w
  cross join unnest($2::text[]) f (fault)
  left join lateral (
    select n.stage, n.inspected_at::date::text seen_on from finding g join inspection n on n.workshop_id = g.workshop_id and n.id = g.inspection_id
    where g.workshop_id = b.workshop_id and g.batch_id = b.id and g.fault = f.fault and g.withdrawn_at is null order by n.inspected_at, n.id limit 1
  ) seen on true
  left join lateral (
    select g.bars_affected, g.bars_looked_at from finding g
    where g.workshop_id = b.workshop_id and g.batch_id = b.id and g.fault = f.fault and g.withdrawn_at is null
    order by g.severity desc, g.bars_affected desc nulls last, g.id limit 1
  ) worst on true
  order by l.code, b.made_on, b.code, f.fault`;

/** The rows of a claim through a cursor, in constant memory. */
export async function* claimRows(tx: WorkshopTransaction, claim: ClaimChoice): AsyncGenerator<ClaimRow> {
  const statement = `declare claim_rows no scroll cursor for ${ROWS_SQL}`;
  await tx.rows(statement, [claim.lotIds, claim.faults, claim.from, claim.to]);
  const fetchPage = `fetch ${PAGE} from claim_rows`;
  for (;;) {
    const rows = await tx.rows<ClaimRow>(fetchPage);
    yield* rows;
    if (rows.length < PAGE) return;
  }
}

const METHOD_CELL: Record<Method, string> = { cold: 'cold', 'cold-oven': 'cold oven-gelled', hot: 'hot', 'hot-fluid': 'hot fluid', rebatch: 'rebatch' };
const round = (value: number | null, decimals: number) => (value === null ? null : Number(value.toFixed(decimals)));
const percent = (fraction: number | null, decimals = 1) => round(fraction === null ? null : fraction * 100, decimals);
/** Shares of fats leave in steps of ten: a class, not a formula. */
const tens = (fraction: number | null) => (fraction === null ? null : Math.round(fraction * 10) * 10);

/** Mass of all fragrance in the finished bar, per cent; null where not everything was weighed. */
function ofFinished({ method, chargedG, scentG, cookLoss }: ClaimRow): number | null {
  if (chargedG === null || !scentG) return null;
  return percent(scentG / (chargedG * (1 - (cookLoss ?? 0)) * (1 - CURE_LOSS[familyOf(method)])), 2);
}

function formulaClass(row: ClaimRow): string {
  const fats = row.hardShare === null ? null : `hard fats ${tens(row.hardShare)} %, lauric oils ${tens(row.lauricShare ?? 0)} %`;
  return [row.hasAnimalFat ? 'animal' : 'vegetable', fats, ...row.additives.map((name) => name.toLowerCase())].filter(Boolean).join(', ');
}

const CELLS: Record<ClaimColumn, (row: ClaimRow, claim: ClaimChoice, today: string) => Cell> = {
  'claim number': (_row, claim) => claim.number,
  supplier: (row) => row.supplier,
  'fragrance name': (row) => row.fragrance,
  'supplier product number': (row) => row.productNumber,
  'lot code': (row) => row.lot,
  'received on': (row) => row.receivedOn,
  'opened on': (row) => row.openedOn,
  'best before': (row) => row.bestBeforeOn,
  'batch code': (row) => row.batch,
  'made on': (row) => row.madeOn,
  method: (row) => METHOD_CELL[row.method],
  'formula class': formulaClass,
  'hard fats percent': (row) => tens(row.hardShare),
  'lauric oils percent': (row) => tens(row.lauricShare ?? (row.hardShare === null ? null : 0)),
  'superfat percent': (row) => percent(row.superfat, 0),
  'lye concentration percent': (row) => percent(row.concentration),
  'oil temperature C': (row) => round(row.oilC, 1),
  'lye temperature C': (row) => round(row.lyeC, 1),
  'temperature when fragrance added C': (row) => round(row.scentC, 1),
  'fragrance percent of oils': (row) => percent(row.load, 2),
  'fragrance percent of finished soap': ofFinished,
  'share of this lot in the fragrance percent': (row) => percent(row.lotShare === null ? null : Math.min(1, row.lotShare), 0),
  'colourants used': (row) => (row.hasColourant ? 'yes' : 'no'),
  additives: (row) => row.additives.join('; ') || null,
  fault: (row) => catalogueFault(row.fault as CatalogueSlug).name,
  'fault found': (row, _claim, today) => (row.severity === null ? (cannotBeSeenYet(row.fault as CatalogueSlug, row.madeOn, today) ? 'not yet' : 'not checked') : row.severity > 0 ? 'found' : 'clear'),
  'severity 1 to 3': (row) => row.severity || null,
  'first seen at': (row) => row.stage,
  'first seen on': (row) => row.seenOn,
  'bars affected': (row) => row.barsAffected,
  'bars looked at': (row) => row.barsLookedAt,
  'photo references': (row) => row.photos.join('; ') || null,
  remarks: (_row, claim) => claim.remarks,
};

/** Columns that go out, in order. */
export function claimColumns(claim: ClaimChoice): ClaimColumn[] {
  return CLAIM_COLUMNS.map(({ name }) => name).filter((name) => !claim.leaveOut.includes(name));
}

export function claimCells(row: ClaimRow, claim: ClaimChoice, columns: readonly ClaimColumn[], today: string): Cell[] {
  return columns.map((column) => CELLS[column](row, claim, today));
}
