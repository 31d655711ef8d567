import { describe, expect, it } from 'vitest';
import { drawPicture } from '#server/demo/pictures/draw-picture.ts';
import { drawPictures } from '#server/demo/pictures/draw-pictures.ts';
import { aWish } from './a-wish.ts';

describe('drawPictures', () => {
  it('draws on threads what is drawn without them', async () => {
    const wishes = ['QL-0001', 'QL-0002', 'QL-0003'].map((code) => aWish({ code }));
    const drawn = new Map<number, Buffer>();
    await drawPictures(wishes, { workers: 2, onDone: (at, picture) => void drawn.set(at, picture.jpeg) });
    expect([...drawn.keys()].sort()).toEqual([0, 1, 2]);
    const alone = await drawPicture(aWish({ code: 'QL-0002' }));
    expect(drawn.get(1)?.equals(alone.jpeg)).toBe(true);
  }, 60_000);

  it('stops and says why when a picture cannot be kept', async () => {
    const onDone = () => Promise.reject(new Error('the store is full'));
    await expect(drawPictures([aWish(), aWish({ code: 'QL-0002' })], { workers: 2, onDone })).rejects.toThrow('the store is full');
  }, 60_000);
});
