import type { AnyBatchView } from '#shared/batches.ts';
import type { InspectionView } from '#shared/inspections.ts';
import type { PhotoView } from '#shared/photos.ts';
import { STAGES, type Stage } from '#shared/words/stages.ts';
import { STAGES_DONE } from './looked-at.ts';

export interface ShelfPlace {
  stage: Stage;
  inspections: InspectionView[];
  photos: PhotoView[];
  found: { fault: string; severity: number }[];
  clear: number;
}

/** What stands over each stage of a batch: its looks and pictures, and a gap where a stage is done and nobody looked. */
export function stageShelf(batch: Pick<AnyBatchView, 'state'>, inspections: readonly InspectionView[], photos: readonly PhotoView[]): ShelfPlace[] {
  return STAGES.flatMap((stage) => {
    const looks = inspections.filter((inspection) => inspection.stage === stage);
    const pictures = photos.filter((photo) => photo.stage === stage);
    if (looks.length === 0 && pictures.length === 0 && !STAGES_DONE[batch.state].includes(stage)) return [];
    const worst = new Map<string, number>();
    for (const { fault, severity, isWithdrawn } of looks.flatMap(({ findings }) => findings)) {
      if (!isWithdrawn) worst.set(fault, Math.max(severity, worst.get(fault) ?? 0));
    }
    const found = [...worst].map(([fault, severity]) => ({ fault, severity })).sort((a, b) => b.severity - a.severity);
    const clear = new Set(looks.flatMap(({ answers }) => answers).filter(({ fault, answer }) => answer === 'clear' && !worst.has(fault)).map(({ fault }) => fault));
    return [{ stage, inspections: looks, photos: pictures, found, clear: clear.size }];
  });
}
