import { randomOf } from '../random.ts';
import { rubEdges } from './body.ts';
import { encode } from './encode.ts';
import { paintFaults } from './faults/paint.ts';
import { develop, layBoard } from './lamp.ts';
import { lightOf } from './light.ts';
import { lookOf } from './look.ts';
import { layProps } from './props.ts';
import { laySoap } from './scenes.ts';
import { blankSheet } from './sheet.ts';
import type { FaultRegion, LoafPicture, LoafPictureSpec } from './spec.ts';

/** Pixels of the upright picture, three bytes each, and where its faults are seen; the same for the same spec. */
export function drawPixels(spec: LoafPictureSpec): { pixels: Uint8Array; width: number; height: number; regions: FaultRegion[] } {
  const width = spec.width ?? 1100, height = spec.height ?? 760, heightUnits = (1000 * height) / width;
  const sheet = blankSheet(width, height);
  const look = lookOf(spec);
  // Each part has a stream of its own, or one more fault would move the label.
  const stream = (name: string) => randomOf(7, name, spec.batchCode, spec.scene, spec.takenAt, spec.seed);
  layBoard(sheet, stream('board').whole(0, 511));
  const patches = laySoap(sheet, spec, look, heightUnits, stream('hands'));
  const regions = paintFaults(sheet, spec, look, patches, heightUnits);
  layProps(sheet, spec, heightUnits, stream('props'));
  rubEdges(sheet);
  return { pixels: develop(sheet, lightOf(spec)), width, height, regions };
}

/**
 * A photo of a loaf and its faults, worked out from data: a height field and a colour field lit by
 * one low lamp, with cast shadows, encoded as a phone would.
 */
export async function drawLoafPicture(spec: LoafPictureSpec): Promise<LoafPicture> {
  const { pixels, width, height, regions } = drawPixels(spec);
  return { jpeg: await encode(pixels, width, height, spec), width, height, regions };
}
