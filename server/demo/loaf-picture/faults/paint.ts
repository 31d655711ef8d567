import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { randomOf } from '../../random.ts';
import { barsWith } from '../layout.ts';
import type { Look } from '../look.ts';
import { type Patch, pictureOf, type Sheet, type SurfaceBox } from '../sheet.ts';
import type { FaultRegion, LoafPictureSpec } from '../spec.ts';
import { falseTrace, overheatingCrack, separation, spooned, volcano } from './batter.ts';
import { type Painter, wholeOf } from './brush.ts';
import { colourBleed, colourShift, colourSpecks, orangeSpots, vanillaBrowning } from './colour.ts';
import { airPockets, embedDetachment, glycerinRivers, heatTunnels, lyePockets, paintEmbed, partialGelRing, ricing, stearicSpots } from './inside.ts';
import { crumbly, dragMarks, foreignMatter, sodaAsh, softSticky, stuckInMould, sweating, wrapMarks } from './surface.ts';

/** Faults that only change the form of the bar; the outline shows them, nothing is painted. */
const formOnly: Painter = (_brush, patch) => (patch.bar > 0 && patch.kind !== 'batter' ? wholeOf(patch, 0) : null);

/** In the order they come into being, so that ash lies over rivers and sweat over ash. */
const PAINTERS: Partial<Record<CatalogueSlug, Painter>> = {
  'colour-shift': colourShift, 'partial-gel-ring': partialGelRing, 'colour-bleed': colourBleed, 'vanilla-browning': vanillaBrowning,
  'glycerin-rivers': glycerinRivers, 'colour-specks': colourSpecks, 'stearic-spots': stearicSpots, ricing, 'false-trace': falseTrace,
  acceleration: spooned, seizing: spooned, volcano, separation, 'overheating-crack': overheatingCrack, 'heat-tunnels': heatTunnels,
  'air-pockets': airPockets, 'lye-pockets': lyePockets, 'embed-detachment': embedDetachment, 'drag-marks': dragMarks, crumbly,
  'uneven-bars': formOnly, warping: formOnly, 'stuck-in-mould': stuckInMould, 'soft-sticky': softSticky, 'orange-spots': orangeSpots,
  'soda-ash': sodaAsh, 'wrap-marks': wrapMarks, sweating, 'foreign-matter': foreignMatter,
};

/** Faults that a picture can show. */
export const DRAWN_FAULTS = Object.keys(PAINTERS) as CatalogueSlug[];

/** Paints the spec's faults on the patches that show them; answers where, in 0..1 of the upright picture. */
export function paintFaults(sheet: Sheet, spec: LoafPictureSpec, look: Look, patches: readonly Patch[], heightUnits: number): FaultRegion[] {
  const loose = spec.faults.some((fault) => fault.slug === 'embed-detachment');
  if (spec.hasEmbeds && !loose) {
    for (const patch of patches) if (patch.kind === 'face' && patch.bar > 0) paintEmbed({ sheet, look, random: randomOf(7, 'embed', spec.batchCode, patch.bar) }, patch, 0);
  }
  return DRAWN_FAULTS.flatMap((slug) => {
    const fault = spec.faults.find((shown) => shown.slug === slug), painter = PAINTERS[slug];
    if (!fault || !painter) return [];
    const bars = barsWith(fault, spec);
    return patches.flatMap((patch): FaultRegion[] => {
      if (patch.bar > 0 && !bars.includes(patch.bar)) return [];
      const box = painter({ sheet, look, spec, severity: fault.severity, random: randomOf(7, slug, spec.batchCode, patch.bar, patch.kind) }, patch);
      return box ? [{ fault: slug, ...(patch.bar > 0 && { bar: patch.bar }), ...inPicture(patch, box, heightUnits) }] : [];
    });
  });
}

function inPicture(patch: Patch, box: SurfaceBox, heightUnits: number): Pick<FaultRegion, 'x' | 'y' | 'w' | 'h'> {
  const corners = [[0, 0], [1, 0], [0, 1], [1, 1]].map(([i, j]) => pictureOf(patch, box.u + (i ?? 0) * box.w, box.v + (j ?? 0) * box.h));
  const cut = (value: number) => Math.min(1, Math.max(0, value));
  const x0 = cut(Math.min(...corners.map((c) => c.cx)) / 1000), x1 = cut(Math.max(...corners.map((c) => c.cx)) / 1000);
  const y0 = cut(Math.min(...corners.map((c) => c.cy)) / heightUnits), y1 = cut(Math.max(...corners.map((c) => c.cy)) / heightUnits);
  return { x: x0, y: y0, w: x1 - x0, h: y1 - y0 };
}
