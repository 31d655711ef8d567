import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import type { Gel, Palette } from '#shared/words/batch-words.ts';
import type { Method } from '#shared/words/methods.ts';

export const SCENES = ['pour', 'loaf', 'faces', 'tops', 'bar'] as const;
/** What lies before the lens: batter in its mould, the unmoulded loaf, cut faces, the cut loaf from above, one or two bars at cure. */
export type Scene = (typeof SCENES)[number];

/** A fault as grave as it is on the day of the picture. */
export interface ShownFault {
  slug: CatalogueSlug;
  severity: SeverityGrade;
  /** Bars that show it of all bars, in 0..1; ignored when `bars` is given. */
  extentShare?: number;
  /** Bars that show it, numbered from 1 at the maker's mark. */
  bars?: readonly number[];
}

export interface LoafPictureSpec {
  scene: Scene;
  /** Written on the label, and seed of what makes this batch recognisable in each of its pictures. */
  batchCode: string;
  /** Second line of the label, such as `WEEK 4  31 AUG`. */
  stageLabel: string;
  /** Moment on the workshop's clock, `YYYY-MM-DDTHH:MM:SS`: decides the light and goes into the EXIF. */
  takenAt: string;
  /** `+01:00` */
  offset: string;
  camera: string;
  /** EXIF orientation of the stored pixels, 1 to 8; regions are of the upright picture. */
  orientation?: number;
  /** Where the picture was taken, degrees north and east, for the few phones that write it. */
  position?: { latitude: number; longitude: number };
  /** Bars of the loaf. */
  bars: number;
  /** Numbers of the bars laid on the board, for `faces` and `bar`; chosen when left out so that the faults are seen. */
  shownBars?: readonly number[];
  palette: Palette;
  /** Key of the formula: some have a grain of their own, such as `salt`. */
  formula: string;
  mould: 'wood' | 'silicone';
  gel: Gel;
  method: Method;
  faults: readonly ShownFault[];
  /** Weeks since the pour; browning, ash and spots go by it. */
  weekOfCure: number;
  hasGreyCard: boolean;
  hasEmbeds?: boolean;
  /** Anything that sets two pictures of one batch apart, such as the count of the picture. */
  seed: number;
  width?: number;
  height?: number;
}

/** Where a fault is plainly seen, in 0..1 of the upright picture. */
export interface FaultRegion { fault: CatalogueSlug; bar?: number; x: number; y: number; w: number; h: number }

export interface LoafPicture { jpeg: Buffer; width: number; height: number; regions: FaultRegion[] }
