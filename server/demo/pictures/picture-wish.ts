import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import { daysBetween } from '#shared/units/days.ts';
import type { Gel, Palette } from '#shared/words/batch-words.ts';
import type { Method } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';
import type { HistoryBatch, HistoryPhoto } from '../history/types.ts';

/** All that decides how one picture of the story looks; plain values, fit to be handed to a worker. */
export interface PictureWish {
  /** Written on the rack label, and seed of what makes this batch recognisable in each of its pictures. */
  code: string;
  stage: Stage;
  /** Days since the pour: browning and spots deepen with it. */
  ageDays: number;
  method: Method;
  formula: string;
  mould: string;
  bars: number;
  palette: Palette;
  gel: Gel;
  hasEmbeds: boolean;
  hasGreyCard: boolean;
  /** Faults to show, as grave as they are by then, on these bars (numbered from the maker's mark). */
  shows: { fault: CatalogueSlug; severity: SeverityGrade; bars: number[] }[];
  /** Moment on the workshop's clock, `YYYY-MM-DDTHH:MM:SS`: decides the light, and goes into the EXIF with its offset. */
  takenLocal: string;
  offset: string;
  camera: string;
  fileName: string;
}

export function pictureWish(batch: HistoryBatch, photo: HistoryPhoto): PictureWish {
  const local = new Date(Date.parse(photo.takenAt) + photo.offsetMinutes * 60_000).toISOString().slice(0, 19);
  const { method, formula, mould, bars, palette, gel, hasEmbeds } = batch.inputs;
  return {
    code: batch.code, stage: photo.stage, ageDays: daysBetween(batch.madeOn, local.slice(0, 10)), method, formula, mould, bars, palette, gel, hasEmbeds,
    hasGreyCard: photo.hasGreyCard, shows: photo.shows, takenLocal: local, offset: offsetText(photo.offsetMinutes), camera: photo.camera,
    fileName: `IMG_${local.replaceAll(/[-:]/g, '').replace('T', '_')}.jpg`,
  };
}

/** `+01:00`, as EXIF writes it. */
function offsetText(minutes: number): string {
  const two = (n: number) => String(n).padStart(2, '0');
  const size = Math.abs(minutes);
  return `${minutes < 0 ? '-' : '+'}${two(Math.floor(size / 60))}:${two(size % 60)}`;
}
