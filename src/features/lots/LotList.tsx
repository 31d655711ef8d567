import type { LotBehaviourRow } from '#shared/lot-behaviour.ts';
import type { LotView } from '#shared/lots.ts';
import { FaultMark } from '#src/components/FaultMark.tsx';
import { LotTag, STANDING_WORDS } from '#src/components/LotTag.tsx';
import { Strip, type Piece } from '#src/components/Strip.tsx';
import { Wire } from '#src/components/Wire.tsx';
import { formatCount } from '#src/lib/format.ts';
import { VERDICT_SETTING, VERDICT_WORDS } from './verdict-words.ts';

const piecesOf = ({ n, events, notChecked }: { n: number; events: number; notChecked: number }): Piece[] => [
  ...Array.from({ length: events }, (): Piece => ({ kind: 'found', severity: 3 })), ...Array.from({ length: n - events }, (): Piece => ({ kind: 'clear' })), ...Array.from({ length: notChecked }, (): Piece => ({ kind: 'not-checked' })),
];

/** Lots as tags, each with its gravest fault cut into cold and hot batches and a wire against its peers. */
export function LotList({ lots, behaviour, lotLink }: { lots: readonly LotView[]; behaviour: ReadonlyMap<string, LotBehaviourRow>; lotLink: (id: string) => string }) {
  return (
    <ul className="m-0 list-none p-0">
      {lots.map((lot) => {
        const own = behaviour.get(lot.id);
        return (
          <li key={lot.id} className="grid grid-cols-[9rem_minmax(0,1.2fr)_minmax(0,1.6fr)_9rem_10rem] items-center gap-x-4 gap-y-1.5 border-b border-line py-2.5 text-row max-bench:grid-cols-[auto_minmax(0,1fr)]">
            <span><LotTag code={lot.code} standing={lot.standing} to={lotLink(lot.id)} /></span>
            <span className="min-w-0"><b className="block font-[560]">{lot.materialName}</b><span className="text-note text-ink-2">{lot.supplierName ?? 'no supplier'}, {STANDING_WORDS[lot.standing]}, {formatCount(lot.batches, 'batch', 'batches')}</span></span>
            {own?.worst ? (
              <>
                <span className="grid min-w-0 grid-cols-[8.5rem_minmax(0,1fr)] items-center gap-x-2 max-bench:col-span-2">
                  <FaultMark fault={own.worst.fault} name={own.worst.name} withName />
                  <span className="grid gap-1 text-fine">
                    {(['cold', 'hot'] as const).map((family) => own.worst && own.worst[family].n + own.worst[family].notChecked > 0 && (
                      <span key={family} className="flex items-center gap-1.5"><span className="w-7">{family}</span><Strip pieces={piecesOf(own.worst[family])} width={6} height={11} gap={1} label={`${family}: ${own.worst[family].events} of ${own.worst[family].n} found`} /><span>{own.worst[family].events}/{own.worst[family].n}</span></span>
                    ))}
                  </span>
                </span>
                <Wire grade={own.worst.boardGrade ?? 'too-few'} estimate={own.worst.all.ratio?.mean ?? null} lower={own.worst.all.ratio?.lower ?? null} upper={own.worst.all.ratio?.upper ?? null} width={130} height={20} />
              </>
            ) : <span className="text-note text-ink-2 bench:col-span-2">{own ? 'nothing found in its batches' : 'no batches to compare'}</span>}
            <span className={own ? VERDICT_SETTING[own.verdict] : 'set-few'}>{own ? VERDICT_WORDS[own.verdict] : 'nothing made yet'}</span>
          </li>
        );
      })}
    </ul>
  );
}
