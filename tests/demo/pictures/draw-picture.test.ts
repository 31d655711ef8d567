import exifr from 'exifr';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { drawPicture, renderPicture } from '#server/demo/pictures/draw-picture.ts';
import { visibleFaults } from '#server/demo/pictures/faults/show-faults.ts';
import { STAGES } from '#shared/words/stages.ts';
import { aWish } from './a-wish.ts';

const width = 1080;
const height = 720;
/** Drawing takes a fraction of a second alone, much longer on a busy machine. */
const slow = 90_000;

/** Mean difference of two pictures inside a region, in steps of 255. */
function meanChange(a: Buffer, b: Buffer, region: { x: number; y: number; width: number; height: number }): number {
  let sum = 0;
  let count = 0;
  for (let y = Math.floor(region.y * height); y < Math.floor((region.y + region.height) * height); y += 1) {
    for (let x = Math.floor(region.x * width) * 3; x < Math.floor((region.x + region.width) * width) * 3; x += 1) {
      sum += Math.abs((a[y * width * 3 + x] ?? 0) - (b[y * width * 3 + x] ?? 0));
      count += 1;
    }
  }
  return sum / count;
}

describe('drawPicture', () => {
  it('gives the same bytes for the same wish, also after another picture', async () => {
    const first = await drawPicture(aWish());
    await drawPicture(aWish({ code: 'QL-0043', stage: 'pour' }));
    const again = await drawPicture(aWish());
    expect(again.jpeg.equals(first.jpeg)).toBe(true);
  }, slow);

  it('writes what a camera writes', async () => {
    const { jpeg } = await drawPicture(aWish());
    const exif: unknown = await exifr.parse(jpeg, { reviveValues: false });
    expect(exif).toMatchObject({ DateTimeOriginal: '2025:04:11 09:15:20', OffsetTimeOriginal: '+01:00', Make: 'Halvorsen', Model: 'P5' });
  }, slow);

  it('is upright once its orientation is undone, however the camera was held', async () => {
    const orientations = new Set<number>();
    for (let number = 1; number <= 24; number += 1) {
      const { jpeg, width: stored } = await drawPicture(aWish({ code: `QL-${String(number).padStart(4, '0')}`, stage: 'unmould' }));
      const { orientation = 1 } = await sharp(jpeg).metadata();
      orientations.add(orientation);
      const { data, info } = await sharp(jpeg).autoOrient().removeAlpha().raw().toBuffer({ resolveWithObject: true });
      expect([info.width, info.height]).toEqual([width, height]);
      expect(stored).toBe(orientation > 4 ? height : width);
      // The kraft label lies at the bottom right: warmer than the board.
      const label = (660 * width + 940) * 3;
      expect((data[label] ?? 0) - (data[label + 2] ?? 0)).toBeGreaterThan(15);
    }
    expect(orientations.size).toBeGreaterThan(1);
  }, slow);

  it.each(STAGES)('draws something at %s that differs between batches', (stage) => {
    const one = renderPicture(aWish({ stage })).pixels;
    expect(one.equals(renderPicture(aWish({ stage, code: 'QL-0099' })).pixels)).toBe(false);
  }, slow);
});

describe('faults in pictures', () => {
  it.each(visibleFaults)('%s changes the picture where it says', (fault) => {
    const wish = aWish({ stage: 'in-use', shows: [{ fault, severity: 2, bars: [3, 4, 5, 8] }] });
    const { pixels, regions } = renderPicture(wish);
    expect(regions).toHaveLength(1);
    const [region] = regions;
    if (!region) return;
    expect(region.fault).toBe(fault);
    expect(Math.min(region.x, region.y)).toBeGreaterThanOrEqual(0);
    expect(Math.min(region.width, region.height)).toBeGreaterThan(0.02);
    expect(Math.max(region.x + region.width, region.y + region.height)).toBeLessThanOrEqual(1);
    // The same bars of the same batch without it: a smell is never drawn.
    const clean = renderPicture(aWish({ stage: 'in-use', shows: [{ fault: 'scent-fade', severity: 2, bars: [3, 4, 5, 8] }] })).pixels;
    expect(meanChange(pixels, clean, region)).toBeGreaterThan(0.4);
  }, slow);

  it('shows a graver fault more plainly', () => {
    const region = { x: 0, y: 0, width: 1, height: 0.8 };
    const clean = renderPicture(aWish({ stage: 'in-use' })).pixels;
    const changes = ([1, 2, 3] as const).map((severity) => meanChange(renderPicture(aWish({ stage: 'in-use', shows: [{ fault: 'vanilla-browning', severity, bars: [] }] })).pixels, clean, region));
    expect(changes).toEqual([...changes].sort((a, b) => a - b));
  }, slow);
});
