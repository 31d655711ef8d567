import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { barsUnder, boxBetween, clampView, moveMark, toPicture, toStage, WHOLE, zoomAt } from '#src/components/photo-geometry.ts';

const share = fc.double({ min: 0, max: 1, noNaN: true });
const view = fc.record({ zoom: fc.double({ min: 1, max: 8, noNaN: true }), x: share, y: share }).map(clampView);

describe('a view of a photo', () => {
  it('leads from stage to picture and back to the same place', () => {
    fc.assert(fc.property(view, share, share, (seen, x, y) => {
      const back = toStage(seen, toPicture(seen, { x, y }));
      expect(back.x).toBeCloseTo(x, 9);
      expect(back.y).toBeCloseTo(y, 9);
    }));
  });

  it('keeps the picture’s point under the finger while zooming in', () => {
    const before = toPicture(WHOLE, { x: 0.3, y: 0.7 });
    const after = toPicture(zoomAt(WHOLE, 3, { x: 0.3, y: 0.7 }), { x: 0.3, y: 0.7 });
    expect(after.x).toBeCloseTo(before.x, 9);
    expect(after.y).toBeCloseTo(before.y, 9);
  });

  it('never shows beyond the picture’s edge', () => {
    fc.assert(fc.property(view, fc.double({ min: 0.1, max: 10, noNaN: true }), share, share, (seen, factor, x, y) => {
      const next = zoomAt(seen, factor, { x, y });
      expect(next.x - 0.5 / next.zoom).toBeGreaterThanOrEqual(-1e-9);
      expect(next.x + 0.5 / next.zoom).toBeLessThanOrEqual(1 + 1e-9);
    }));
  });
});

describe('marks', () => {
  it('are drawn from whichever corner the finger starts', () => {
    expect(boxBetween({ x: 0.6, y: 0.2 }, { x: 0.4, y: 0.5 })).toEqual({ x: 0.4, y: 0.2, width: expect.closeTo(0.2, 9), height: expect.closeTo(0.3, 9) });
  });

  it('stay on the picture when moved', () => {
    expect(moveMark({ x: 0.9, y: 0.1, width: 0.2, height: 0.1 }, 0.05, -0.5)).toMatchObject({ x: 0.8, y: 0 });
  });

  it('tell the bars they touch', () => {
    expect(barsUnder({ x: 0.09 }, 12)).toEqual([1]);
    expect(barsUnder({ x: 0.6, width: 0.3 }, 12)).toEqual([8, 9, 10, 11, 12]);
  });
});
