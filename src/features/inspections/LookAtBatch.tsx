import { useSuspenseQueries } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { v7 as uuidv7 } from 'uuid';
import type { AnyBatchView } from '#shared/batches.ts';
import type { MarkWish } from '#shared/inspections.ts';
import type { Stage } from '#shared/words/stages.ts';
import { barCounts, type BarAnswer } from '#src/components/BarPicker.tsx';
import { Block } from '#src/components/Block.tsx';
import { barsUnder, moveMark, type Box, type Point } from '#src/components/photo-geometry.ts';
import { EmptyState } from '#src/components/states.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { faultsQuery } from '#src/features/faults/faults.queries.ts';
import { photosOfBatchQuery, pictureAddress } from '#src/features/photos/photos.queries.ts';
import { useMay } from '#src/features/session/session.queries.ts';
import { STAGE_WORDS } from '#src/lib/words.ts';
import { FaultChecklist } from './FaultChecklist.tsx';
import { likelyFaultsQuery } from './inspections.queries.ts';
import { KeptFindings } from './KeptFindings.tsx';
import { firstSeverity, MarkEditor, type Draft } from './MarkEditor.tsx';
import { PhotoMarker, type ShownMark } from './PhotoMarker.tsx';
import { faultsAtStage, likelyFirst } from './stage-faults.ts';
import { useLook } from './use-look.ts';

interface LookAtBatchProps {
  batch: AnyBatchView;
  stage: Stage;
  /** Where photos are added; made by the screen. */
  photoAdder: ReactNode;
}

/** A mark not yet kept, on one photo. */
type OpenMark = { photoId: string; mark: Point & { width?: number; height?: number } };

/** Stages before the cut judge the loaf: there are no bars to count. */
const countsBars = (stage: Stage) => stage !== 'pour' && stage !== 'unmould';

/** Looking at a batch: touch what you see on a photo, say what it is, keep it; answer the rest of the list. */
export function LookAtBatch({ batch, stage, photoAdder }: LookAtBatchProps) {
  const [{ data: catalogue }, { data: photos }, { data: likely }] = useSuspenseQueries({ queries: [faultsQuery, photosOfBatchQuery(batch.id), likelyFaultsQuery(batch.id, stage)] });
  const look = useLook(batch.id, stage);
  const toasts = useToasts();
  const canMark = useMay()('inspection.write');
  const [photoId, setPhotoId] = useState<string | null>(null);
  const [draft, setDraft] = useState<Draft | null>(null);
  const [openMarks, setOpenMarks] = useState<OpenMark[]>([]);
  const [chosen, setChosen] = useState<string | null>(null);

  const atStage = faultsAtStage(catalogue, stage, batch.method);
  const ordered = likelyFirst(atStage, likely);
  const taken = new Set(look.findings.map(({ fault }) => fault));
  const ofStage = photos.filter((photo) => (photo.stage ?? photo.proposedStage) === stage);
  const shownPhotos = ofStage.length > 0 ? ofStage : photos;
  const photo = shownPhotos.find(({ id }) => id === photoId) ?? shownPhotos.at(-1);
  const nameOf = (slug: string) => catalogue.find((fault) => fault.slug === slug)?.name ?? slug;

  const freshDraft = (slug: string | undefined, bars: readonly number[]): Draft | null => {
    const fault = ordered.find((option) => option.slug === slug) ?? ordered.find((option) => !taken.has(option.slug)) ?? ordered[0];
    if (!fault) return null;
    const count = countsBars(stage) ? (batch.bars ?? 0) : 0;
    return { fault: fault.slug, severity: firstSeverity(fault), note: '', bars: Array.from({ length: count }, (_bar, index): BarAnswer => (bars.includes(index + 1) ? 'found' : 'clear')) };
  };

  const mark = (place: Point | Box) => {
    if (!photo) return;
    setOpenMarks((marks) => [...marks, { photoId: photo.id, mark: place }]);
    setDraft((current) => current ?? freshDraft(undefined, barsUnder(place, batch.bars ?? 1)));
  };
  const close = () => { setDraft(null); setOpenMarks([]); };

  const keep = async () => {
    if (!draft) return;
    const [kept, marks] = [draft, openMarks];
    const counts = barCounts(kept.bars);
    const wish = {
      id: uuidv7(), fault: kept.fault, severity: kept.severity, note: kept.note || null, marks: marks.map(({ photoId: onPhoto, mark: place }) => markWish(onPhoto, place)),
      bars: kept.bars.length > 0 ? kept.bars.flatMap((bar, index) => (bar === 'found' ? [index + 1] : [])) : null,
      barsAffected: kept.bars.length > 0 ? counts.affected : null, barsLookedAt: kept.bars.length > 0 ? counts.lookedAt : null,
    };
    close();
    const isKept = await look.keep(wish);
    // Nothing typed is lost: what could not be kept comes back into the editor.
    if (!isKept) { setDraft(kept); setOpenMarks(marks); return; }
    toasts.tell(`${nameOf(kept.fault)} is kept`, () => look.takeBack(wish.id));
  };

  const shown: ShownMark[] = [
    ...look.findings.flatMap((finding) => finding.marks.filter((placed) => placed.photoId === photo?.id).map((placed) => ({
      key: placed.id, mark: placed, fault: finding.fault, name: nameOf(finding.fault), severity: finding.severity, isChosen: chosen === finding.id, onChoose: () => setChosen(finding.id),
    }))),
    ...openMarks.flatMap((open, index) => (open.photoId !== photo?.id || !draft ? [] : [{
      key: `open-${index}`, mark: open.mark, fault: draft.fault, name: nameOf(draft.fault), severity: draft.severity, isChosen: true,
      onMove: (dx: number, dy: number) => setOpenMarks((marks) => marks.map((other, at) => (at === index ? { ...other, mark: moveMark(other.mark, dx, dy) } : other))),
    }])),
  ];

  return (
    <div className="grid grid-cols-1 bench:grid-cols-[minmax(0,1fr)_27rem] wall:grid-cols-[minmax(0,1fr)_31rem]">
      <div className="min-w-0 bench:pr-5">
        {photo ? (
          <PhotoMarker key={photo.id} photo={photo} alt={photo.alt ?? `${batch.code}, ${STAGE_WORDS[photo.stage ?? stage].toLowerCase()}`} marks={shown} canMark={canMark} onMark={mark} />
        ) : (
          <EmptyState title={`No photo of ${batch.code} yet`} act={photoAdder}>Faults can be kept without one: choose “found” in the list.</EmptyState>
        )}
        {photo && canMark && !draft && <p className="mt-2 text-rail font-[640] bench:hidden">Touch what you see. <span className="text-note font-normal text-ink-2">A point, or draw round an area.</span></p>}
        {shownPhotos.length > 1 && (
          <ul className="mt-2.5 flex gap-2 overflow-x-auto pb-1" aria-label="Photos">
            {shownPhotos.map((other) => (
              <li key={other.id} className="shrink-0">
                <button type="button" aria-pressed={other.id === photo?.id} className="grid gap-1 text-left text-note aria-pressed:font-[640]" onClick={() => setPhotoId(other.id)}>
                  <img src={pictureAddress(other.id, 'thumb')} alt="" width={120} height={80} loading="lazy" className={`h-20 w-30 object-cover ${other.id === photo?.id ? 'outline-3 -outline-offset-3 outline-pin' : ''}`} />
                  {STAGE_WORDS[other.stage ?? other.proposedStage ?? stage]}
                </button>
              </li>
            ))}
          </ul>
        )}
        {photo && <div className="mt-3">{photoAdder}</div>}
      </div>
      <div className="grid content-start gap-5 bench:border-l bench:border-line max-bench:mt-4">
        {draft && <MarkEditor draft={draft} onDraft={setDraft} faults={ordered} taken={taken} onKeep={() => void keep()} onTakeBack={close} />}
        <div className="grid gap-5 bench:px-5">
          {!draft && canMark && <p className="text-note text-ink-2 max-bench:hidden">Touch the photo where you see something, or choose “found” below.</p>}
          <KeptFindings findings={look.findings} faults={catalogue} chosen={chosen} onChoose={(id) => { setChosen(id); setPhotoId(look.findings.find((finding) => finding.id === id)?.marks[0]?.photoId ?? photoId); }} isReadOnly={!canMark} onTakeBack={(finding) => look.takeBack(finding.id)} />
          <FaultChecklist stageName={STAGE_WORDS[stage]} faults={atStage} answerOf={look.answerOf} onAnswer={look.answer} isReadOnly={!canMark} onFound={(fault) => { setOpenMarks([]); setDraft(freshDraft(fault, [])); }} />
          {look.isSending && <p role="status" className="text-note text-ink-2">Sending …</p>}
          <Block kind="quiet" className="justify-self-start" onClick={() => window.history.back()}>Leave for now</Block>
        </div>
      </div>
    </div>
  );
}

function markWish(photoId: string, { x, y, width, height }: Point & { width?: number; height?: number }): MarkWish {
  return width && height ? { id: uuidv7(), photoId, shape: 'box', x, y, width, height } : { id: uuidv7(), photoId, shape: 'point', x, y };
}
