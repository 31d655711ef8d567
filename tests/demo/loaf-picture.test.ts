import exifr from 'exifr';
import sharp from 'sharp';
import { describe, expect, it, test } from 'vitest';
import { drawLoafPicture, drawPixels } from '#server/demo/loaf-picture/draw.ts';
import { DRAWN_FAULTS } from '#server/demo/loaf-picture/faults/paint.ts';
import { photoPalette } from '#server/demo/loaf-picture/palette.ts';
import { drawLoafPictures } from '#server/demo/loaf-picture/pool.ts';
import type { LoafPictureSpec, Scene } from '#server/demo/loaf-picture/spec.ts';
import { Palette } from '#shared/words/batch-words.ts';

const batter = new Set(['ricing', 'acceleration', 'seizing', 'separation', 'false-trace', 'volcano']);
const onTop = new Set(['overheating-crack']);

function aSpec(over: Partial<LoafPictureSpec> = {}): LoafPictureSpec {
  return {
    scene: 'faces', batchCode: 'QL-0068', stageLabel: 'CUT 11 APR', takenAt: '2025-04-11T23:34:05', offset: '+01:00', camera: 'Corrie One', bars: 12,
    shownBars: [3, 8], palette: { base: '#cdb7a6', second: '#7d3f4a', third: '#e6d8c8', design: 'swirl' }, formula: 'everyday', mould: 'wood', gel: 'none', method: 'cold',
    faults: [], weekOfCure: 4, hasGreyCard: true, seed: 1, width: 440, height: 304, ...over,
  };
}

function sceneOf(slug: string): Scene {
  return batter.has(slug) ? 'pour' : onTop.has(slug) ? 'tops' : 'faces';
}

describe('drawLoafPicture', () => {
  it('draws the same picture for the same spec, byte for byte', async () => {
    const [a, between, b] = [await drawLoafPicture(aSpec()), await drawLoafPicture(aSpec({ scene: 'loaf', seed: 2 })), await drawLoafPicture(aSpec())];
    expect(a.jpeg.equals(b.jpeg)).toBe(true);
    expect(a.jpeg.equals(between.jpeg)).toBe(false);
  });

  it('writes the moment with its offset and the camera into the EXIF', async () => {
    const { jpeg } = await drawLoafPicture(aSpec());
    const read = (await exifr.parse(jpeg, { reviveValues: false })) as Record<string, unknown>;
    expect(read).toMatchObject({ DateTimeOriginal: '2025:04:11 23:34:05', OffsetTimeOriginal: '+01:00', Make: 'Corrie', Model: 'Corrie One' });
    expect(await exifr.gps(jpeg)).toBeUndefined();
  });

  it('writes a position when the phone did', async () => {
    const { jpeg } = await drawLoafPicture(aSpec({ position: { latitude: 54.2051, longitude: -2.3 } }));
    const gps = await exifr.gps(jpeg);
    expect(gps?.latitude).toBeCloseTo(54.2051, 4);
    expect(gps?.longitude).toBeCloseTo(-2.3, 4);
  });

  test.each([1, 2, 3, 4, 5, 6, 7, 8])('stores orientation %i so that turning it upright gives the same picture', async (orientation) => {
    const upright = await sharp((await drawLoafPicture(aSpec())).jpeg).raw().toBuffer();
    const { jpeg } = await drawLoafPicture(aSpec({ orientation }));
    expect((await sharp(jpeg).metadata()).orientation).toBe(orientation);
    const { data, info } = await sharp(jpeg).autoOrient().raw().toBuffer({ resolveWithObject: true });
    expect([info.width, info.height]).toEqual([440, 304]);
    expect(meanDifference(upright, data)).toBeLessThan(4);
  });

  test.each(['pour', 'loaf', 'faces', 'tops', 'bar'] as const)('draws a %s with soap that stands out from the board', (scene) => {
    const { pixels, width, height } = drawPixels(aSpec({ scene }));
    expect(pixels).toHaveLength(width * height * 3);
    const middle = averageOf(pixels, width, { x: 0.4, y: 0.35, w: 0.2, h: 0.1 }, height), corner = averageOf(pixels, width, { x: 0, y: 0, w: 0.04, h: 0.04 }, height);
    expect(Math.abs((middle[0] ?? 0) - (middle[2] ?? 0))).toBeGreaterThan(Math.abs((corner[0] ?? 0) - (corner[2] ?? 0)) + 5);
  });

  test.each(DRAWN_FAULTS.flatMap((slug) => [1, 2, 3].map((severity) => [slug, severity] as const)))('shows %s at severity %i where it says so', (slug, severity) => {
    const spec = aSpec({ scene: sceneOf(slug) });
    const clean = drawPixels(spec).pixels;
    const { pixels, width, height, regions } = drawPixels({ ...spec, faults: [{ slug, severity: severity as 1 | 2 | 3 }] });
    expect(regions.length).toBeGreaterThan(0);
    for (const region of regions) {
      expect(region).toMatchObject({ fault: slug });
      expect(Math.min(region.x, region.y, 1 - region.x - region.w, 1 - region.y - region.h)).toBeGreaterThan(-1e-9);
      expect(Math.min(region.w, region.h)).toBeGreaterThan(0);
    }
    expect(Math.max(...regions.map((region) => shareChanged(clean, pixels, width, height, region)))).toBeGreaterThan(0.01);
  });

  it('marks only the bars that show the fault', () => {
    const { regions } = drawPixels(aSpec({ scene: 'tops', faults: [{ slug: 'soda-ash', severity: 2, bars: [8, 9] }] }));
    expect(regions.map((region) => region.bar)).toEqual([8, 9]);
  });
});

describe('drawLoafPictures', () => {
  it('draws on threads what one thread draws', { timeout: 60_000 }, async () => {
    const specs = [aSpec(), aSpec({ scene: 'tops' }), aSpec({ scene: 'pour' })], got = new Map<number, Buffer>();
    await drawLoafPictures(specs, { workers: 2, onDone: (index, { jpeg }) => void got.set(index, jpeg) });
    expect(got.size).toBe(3);
    expect(got.get(1)?.equals((await drawLoafPicture(aSpec({ scene: 'tops' }))).jpeg)).toBe(true);
  });
});

describe('photoPalette', () => {
  it('gives a batch the colours of its formula and scent, as the slice keeps them', () => {
    const dark = Palette.parse(photoPalette('charcoal', 'tideflat'));
    expect(Number.parseInt(dark.base.slice(1, 3), 16)).toBeLessThan(0x70);
    expect(photoPalette('charcoal', 'tideflat')).toEqual(dark);
  });
});

function meanDifference(a: Uint8Array, b: Uint8Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i += 1) sum += Math.abs((a[i] as number) - (b[i] as number));
  return sum / a.length;
}

type Box = { x: number; y: number; w: number; h: number };

/** Share of a region's pixels that changed by more than an eye overlooks. */
function shareChanged(a: Uint8Array, b: Uint8Array, width: number, height: number, { x, y, w, h }: Box): number {
  let changed = 0, seen = 0;
  for (let py = Math.floor(y * height); py < (y + h) * height; py += 1) {
    for (let px = Math.floor(x * width); px < (x + w) * width; px += 1) {
      const k = (py * width + px) * 3;
      seen += 1;
      if (Math.max(...[0, 1, 2].map((c) => Math.abs((a[k + c] ?? 0) - (b[k + c] ?? 0)))) > 8) changed += 1;
    }
  }
  return changed / seen;
}

function averageOf(pixels: Uint8Array, width: number, { x, y, w, h }: Box, height: number): number[] {
  const sums = [0, 0, 0];
  let seen = 0;
  for (let py = Math.floor(y * height); py < (y + h) * height; py += 1) {
    for (let px = Math.floor(x * width); px < (x + w) * width; px += 1, seen += 1) {
      [0, 1, 2].forEach((c) => { sums[c] = (sums[c] ?? 0) + (pixels[(py * width + px) * 3 + c] as number); });
    }
  }
  return sums.map((sum) => sum / seen);
}
