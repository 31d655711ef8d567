import type { PictureWish } from '#server/demo/pictures/picture-wish.ts';

/** A clean cold-process batch of twelve bars, at the cut. */
export function aWish(changes: Partial<PictureWish> = {}): PictureWish {
  return {
    code: 'QL-0042', stage: 'cut', ageDays: 1, method: 'cold', formula: 'everyday', mould: 'M1', bars: 12,
    palette: { base: '#cdb7a6', second: '#7d3f4a', third: '#e6d8c8', design: 'swirl' }, gel: 'none', hasEmbeds: false, hasGreyCard: true, shows: [],
    takenLocal: '2025-04-11T09:15:20', offset: '+01:00', camera: 'Halvorsen P5', fileName: 'IMG_20250411_091520.jpg', ...changes,
  };
}
