import sharp from 'sharp';
import { randomOf } from '../random.ts';
import { pictureHeight, pictureWidth } from './raster.ts';
import type { PictureWish } from './picture-wish.ts';

/** Turns of the pixels, clockwise, that a viewer undoes for each EXIF orientation a hand-held camera writes. */
const turns = [[1, 0, 16], [6, 270, 2], [3, 180, 2], [8, 90, 1]] as const;

/** Place of the invented workshop; only some people have their camera write it. */
const place = { IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '53/1 24/1 1830/100', GPSLongitudeRef: 'W', GPSLongitude: '1/1 46/1 520/100' } };

/**
 * Stores pixels as a camera would: JPEG with its moment and offset, sometimes held sideways,
 * sometimes with the place in it.
 */
export async function encodePicture(pixels: Buffer, wish: PictureWish): Promise<{ jpeg: Buffer; width: number; height: number }> {
  const random = randomOf(7, 'camera', wish.code, wish.stage, wish.takenLocal);
  const [orientation, degrees] = random.weighted(turns.map(([tag, turn, weight]) => [[tag, turn] as const, weight] as const));
  const [make = 'Corrie', ...model] = wish.camera.split(' ');
  const taken = `${wish.takenLocal.slice(0, 10).replaceAll('-', ':')} ${wish.takenLocal.slice(11)}`;
  const raw = sharp(pixels, { raw: { width: pictureWidth, height: pictureHeight, channels: 3 } });
  const { data, info } = await (degrees === 0 ? raw : raw.rotate(degrees))
    .withExif({
      IFD0: { Make: make, Model: model.join(' '), DateTime: taken },
      IFD2: { DateTimeOriginal: taken, OffsetTimeOriginal: wish.offset, DateTimeDigitized: taken },
      ...(random.chance(0.07) ? place : {}),
    })
    .withMetadata({ orientation })
    .jpeg({ quality: 84, chromaSubsampling: '4:2:0' })
    .toBuffer({ resolveWithObject: true });
  return { jpeg: data, width: info.width, height: info.height };
}
