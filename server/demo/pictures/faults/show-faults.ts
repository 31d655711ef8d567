import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import { randomOf } from '../../random.ts';
import type { Body } from '../body.ts';
import type { Placed, Scene } from '../layout.ts';
import type { Look } from '../look.ts';
import type { PictureWish } from '../picture-wish.ts';
import { type Raster, smooth } from '../raster.ts';
import * as body from './body-faults.ts';
import * as colour from './colour-faults.ts';
import { Extent } from './extent.ts';
import { type FaultPainter, lay } from './fault-pass.ts';
import * as inside from './inside-faults.ts';
import * as surface from './surface-faults.ts';

/** Where a fault is plainly visible, in shares of the upright picture. */
export interface Region { fault: CatalogueSlug; x: number; y: number; width: number; height: number }

/** The fault lies in the outline, which the layout has drawn already. */
const inOutline: FaultPainter = (pass) => lay(pass, (k, _x, _y, depth) => {
  pass.raster.blue[k] = (pass.raster.blue[k] as number) * 0.995;
  return depth < 30 ? 1 : 0.5;
});

/** In the order they are laid over each other: what is in the mass first, films and liquids last. Smells show nowhere. */
const painters: readonly (readonly [CatalogueSlug, FaultPainter])[] = [
  ['uneven-bars', inOutline], ['warping', inOutline], ['colour-shift', colour.colourShift], ['colour-bleed', colour.colourBleed], ['design-differs', colour.designDiffers],
  ['vanilla-browning', colour.vanillaBrowning], ['partial-gel-ring', inside.partialGelRing], ['acceleration', body.acceleration], ['seizing', body.seizing],
  ['volcano', body.volcano], ['separation', body.separation], ['heat-tunnels', inside.heatTunnels], ['glycerin-rivers', inside.glycerinRivers],
  ['stearic-spots', inside.stearicSpots], ['ricing', inside.ricing], ['colour-specks', colour.colourSpecks], ['embed-detachment', body.embedDetachment],
  ['air-pockets', inside.airPockets], ['lye-heavy', body.chalky], ['lye-pockets', body.lyePockets], ['overheating-crack', body.overheatingCrack],
  ['drag-marks', surface.dragMarks], ['wrap-marks', surface.wrapMarks], ['soft-sticky', body.softSticky], ['orange-spots', colour.orangeSpots],
  ['stuck-in-mould', surface.stuckInMould], ['crumbly', body.crumbly], ['damaged-in-transit', body.crumbly], ['soda-ash', surface.sodaAsh],
  ['foreign-matter', colour.foreignMatter], ['sweating', surface.sweating],
];

/** Faults that a picture can show. */
export const visibleFaults: readonly CatalogueSlug[] = painters.map(([fault]) => fault);

interface Showing { raster: Raster; wish: PictureWish; look: Look; scene: Scene; placed: readonly Placed[] }

/** Lays every wished fault over the bars that carry it and says where each can be seen. */
export function showFaults({ raster, wish, look, scene, placed }: Showing): Region[] {
  const regions: Region[] = [];
  for (const [fault, paint] of painters) {
    const shown = wish.shows.find((one) => one.fault === fault);
    if (!shown) continue;
    const extents: (Extent | undefined)[] = [];
    const carries = new Set(shown.bars);
    for (const one of placed) {
      extents.push(undefined);
      if (one.body.bar > 0 && carries.size > 0 && !carries.has(one.body.bar)) continue;
      // A fault of one loaf looks alike at each stage: its draws hang on the bar, not on the picture.
      const random = randomOf(7, 'fault', wish.code, fault, one.body.bar);
      const extent = new Extent(raster.width, raster.height);
      extents[extents.length - 1] = extent;
      paint({ raster, ...one, look, severity: shown.severity, ageDays: wish.ageDays, random, reach: reachOf(one.body, carries, wish.bars), extent });
    }
    const box = clearest(extents, scene === 'tops')?.box();
    if (box) regions.push({ fault, ...box });
  }
  return regions;
}

/** Where to point: the bar that shows the fault best, with its neighbours in an unbroken run when bars lie side by side. */
function clearest(extents: readonly (Extent | undefined)[], isRun: boolean): Extent | undefined {
  const amounts = extents.map((extent) => extent?.amount ?? 0);
  const most = Math.max(0, ...amounts);
  const best = amounts.indexOf(most);
  const middle = extents[best];
  if (!middle || most === 0 || !isRun) return middle;
  for (const step of [-1, 1]) {
    for (let i = best + step; (amounts[i] ?? 0) > most * 0.2; i += step) middle.include(extents[i] as Extent);
  }
  return middle;
}

/** On an uncut loaf a fault fades out at the sides of the bars that will carry it. */
function reachOf(loaf: Body, carries: ReadonlySet<number>, bars: number): (x: number) => number {
  if (loaf.bar > 0 || carries.size === 0 || carries.size >= bars) return () => 1;
  const steps = 256;
  const share = Float32Array.from({ length: steps }, (_, i) => {
    const at = (i / (steps - 1)) * bars;
    let most = 0;
    for (const bar of carries) most = Math.max(most, smooth(0.5, 0.1, Math.max(0, Math.abs(at - bar + 0.5) - 0.5)));
    return most;
  });
  return (x) => share[Math.round(Math.min(1, Math.max(0, (x / loaf.halfWidth + 1) / 2)) * (steps - 1))] as number;
}
