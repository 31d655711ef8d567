import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { BEHAVING_KINDS, BehavingKind } from '#shared/lot-behaviour.ts';
import { LOT_STANDINGS, LotStanding, MATERIAL_KINDS, MaterialKind } from '#shared/words/lot-words.ts';
import { STANDING_WORDS } from '#src/components/LotTag.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { Picker, SentenceFilter } from '#src/components/SentenceFilter.tsx';
import { EmptyState, ErrorState, LoadingShape } from '#src/components/states.tsx';
import { AddLotForm } from '#src/features/lots/AddLotForm.tsx';
import { LotList } from '#src/features/lots/LotList.tsx';
import { lotsBehaviourQuery, lotsQuery } from '#src/features/lots/lots.queries.ts';
import { useMay } from '#src/features/session/session.queries.ts';
import { formatCount } from '#src/lib/format.ts';
import { paths } from '../paths.ts';

const KIND_WORDS: Record<MaterialKind, string> = { fat: 'fat', alkali: 'alkali', liquid: 'liquid', fragrance: 'scent', colourant: 'colourant', additive: 'additive', packaging: 'packaging' };
const ANY = 'any';

/** Lots as kraft tags: what each did in cold and in hot batches, and how it stands. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const may = useMay();
  const kind = MaterialKind.safeParse(search.get('kind')).data ?? 'fragrance';
  const standing = LotStanding.safeParse(search.get('standing')).data;
  const behaving = BehavingKind.safeParse(kind).data;
  const lots = useQuery(lotsQuery({ kind, standing }));
  const behaviour = useQuery({ ...lotsBehaviourQuery(behaving ?? BEHAVING_KINDS[0]), enabled: behaving !== undefined });
  const order = new Map((behaving ? behaviour.data?.items : undefined)?.map((row, at) => [row.lotId, { row, at }]));
  const sorted = [...(lots.data ?? [])].sort((a, b) => (order.get(a.id)?.at ?? 1e6) - (order.get(b.id)?.at ?? 1e6));
  const go = (next: { kind: string; standing: string | undefined }) => setSearch(Object.fromEntries(Object.entries(next).filter((entry): entry is [string, string] => entry[1] !== undefined)));
  return (
    <>
      <title>Lots – Loafmark</title>
      <h1 className="mb-3">Lots</h1>
      <SentenceFilter label="Which lots are shown">
        <span>Show</span>
        <Picker label="Kind" options={MATERIAL_KINDS.map((value) => ({ value, label: KIND_WORDS[value] }))} selected={[kind]} onChange={([next]) => go({ kind: next ?? 'fragrance', standing })}>{KIND_WORDS[kind]}</Picker>
        <span>lots that are</span>
        <Picker label="Standing" options={[{ value: ANY, label: 'in any standing' }, ...LOT_STANDINGS.map((value) => ({ value, label: STANDING_WORDS[value] }))]} selected={[standing ?? ANY]} onChange={([next]) => go({ kind, standing: next === ANY ? undefined : next })} onClear={() => go({ kind, standing: undefined })}>{standing ? STANDING_WORDS[standing] : 'in any standing'}</Picker>
      </SentenceFilter>
      <div className="mt-5"><Rail heading="Gravest first" aside={lots.data && formatCount(lots.data.length, 'lot')} /></div>
      {lots.isPending ? <LoadingShape says="Reading the lots" rows={8} rowClassName="h-14" /> : lots.isError ? <ErrorState error={lots.error} onRetry={() => void lots.refetch()} /> : sorted.length === 0 ? (
        <EmptyState title="No lot fits this sentence">{may('lot.write') ? 'Choose another kind or standing, or add a lot below.' : 'An owner or a maker adds lots.'}</EmptyState>
      ) : <LotList lots={sorted} behaviour={new Map([...order].map(([id, { row }]) => [id, row]))} lotLink={paths.lot} />}
      {behaving && behaviour.isError && <div className="mt-3"><ErrorState error={behaviour.error} onRetry={() => void behaviour.refetch()} /></div>}
      {may('lot.write') && <AddLotForm kind={kind} />}
    </>
  );
}
