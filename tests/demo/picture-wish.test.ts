import { describe, expect, it } from 'vitest';
import { pictureWish } from '#server/demo/pictures/picture-wish.ts';
import { quernby } from './history-support.ts';

const wishes = quernby.batches.flatMap((batch) => batch.photos.map((photo) => ({ batch, photo, wish: pictureWish(batch, photo) })));

describe('picture wish', () => {
  it('tells the time on the workshop’s clock, so that clock and offset give the instant back', () => {
    for (const { photo, wish } of wishes) expect(new Date(`${wish.takenLocal}${wish.offset}`).getTime()).toBe(Math.floor(Date.parse(photo.takenAt) / 1000) * 1000);
    expect(new Set(wishes.map(({ wish }) => wish.offset))).toEqual(new Set(['+00:00', '+01:00']));
  });

  it('asks for no fault on a bar the batch has not, and counts days from the pour', () => {
    for (const { batch, wish } of wishes) {
      expect(wish.ageDays).toBeGreaterThanOrEqual(0);
      for (const shown of wish.shows) expect(Math.max(...shown.bars)).toBeLessThanOrEqual(batch.inputs.bars);
    }
  });

  it('gives each picture of a phone a name of its own', () => {
    expect(new Set(wishes.map(({ wish }) => `${wish.code} ${wish.fileName}`)).size).toBe(wishes.length);
  });
});
