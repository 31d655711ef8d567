import { encodePicture } from './encode.ts';
import { type Region, showFaults } from './faults/show-faults.ts';
import { layOut, sceneOf } from './layout.ts';
import { lightOf } from './light.ts';
import { layoutRandom, lookOf } from './look.ts';
import { noiseOf } from './noise.ts';
import type { PictureWish } from './picture-wish.ts';
import { drawProps } from './props.ts';
import { pictureHeight, pictureWidth } from './raster.ts';
import { shade } from './shade.ts';
import { paintBatter, paintMould } from './surfaces/batter.ts';
import { bareBoard } from './surfaces/board.ts';
import { paintFace } from './surfaces/face.ts';
import { paintTop } from './surfaces/top.ts';

/** Keys of the story's moulds that are not of wood. */
const siliconeMoulds = new Set(['M2']);

export interface Picture {
  jpeg: Buffer;
  /** Of the pixels as stored; the camera may have been held sideways. */
  width: number;
  height: number;
  regions: Region[];
}

/** Draws one picture of the story. The same wish gives the same bytes. */
export async function drawPicture(wish: PictureWish): Promise<Picture> {
  const { pixels, regions } = renderPicture(wish);
  return { ...(await encodePicture(pixels, wish)), regions };
}

/** Pixels of the upright picture before encoding. */
export function renderPicture(wish: PictureWish): { pixels: Buffer; regions: Region[] } {
  const look = lookOf(wish);
  const random = layoutRandom(wish);
  const scene = sceneOf(wish);
  const raster = bareBoard(pictureWidth, pictureHeight, noiseOf(3, 'board'));
  const placed = layOut(wish, scene, look, random);
  for (const { body, offset, scale } of placed) {
    if (body.side === 'face') paintFace(raster, body, look, scale);
    else if (body.side === 'top') paintTop(raster, body, look, offset);
    else {
      paintMould(raster, { ...body, mark: 0, halfWidth: body.halfWidth + 40, halfHeight: body.halfHeight + 34, thickness: 58 }, look, !siliconeMoulds.has(wish.mould));
      paintBatter(raster, body, look);
    }
  }
  const regions = showFaults({ raster, wish, look, scene, placed });
  drawProps(raster, wish, random);
  return { pixels: shade(raster, lightOf(Number(wish.takenLocal.slice(5, 7)), random)), regions };
}
