import type { Noise } from '../noise.ts';
import { emptyRaster, linear, type Raster } from '../raster.ts';

const grey = linear('#8a8b8b');

let kept: { bare: Raster; scene: Raster } | undefined;

/**
 * The neutral grey board everything lies on, ready to be painted over. The board is the same in all
 * pictures, so it is worked out once and copied; the scene handed out is used again by the next call.
 */
export function bareBoard(width: number, height: number, noise: Noise): Raster {
  if (kept?.bare.width !== width || kept.bare.height !== height) {
    kept = { bare: emptyRaster(width, height), scene: emptyRaster(width, height) };
    paintBoard(kept.bare, noise);
  }
  const { bare, scene } = kept;
  for (const plane of ['z', 'red', 'green', 'blue', 'gloss'] as const) scene[plane].set(bare[plane]);
  scene.owner.fill(0);
  return scene;
}

function paintBoard(raster: Raster, noise: Noise): void {
  const { width, height } = raster;
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const k = y * width + x;
      const tooth = noise.grain(x * 0.9, y * 0.9);
      const patch = 1 + (noise.cloud(x * 0.15, y * 0.15) - 0.5) * 0.1 + (tooth - 0.5) * 0.05;
      raster.z[k] = tooth * 0.55;
      raster.red[k] = grey[0] * patch;
      raster.green[k] = grey[1] * patch;
      raster.blue[k] = grey[2] * patch;
    }
  }
}
