import type { Body } from '../body.ts';
import type { Look } from '../look.ts';
import { combed, type Stroke } from './top.ts';

const step = 2;

/**
 * The combed top over a whole body, worked out at every second pixel and read between:
 * ridges are dozens of pixels wide, and four times fewer points are four times quicker.
 * The stroke handed out is the same object each time.
 */
export function combedOver(look: Look, body: Body, offset: number): (x: number, y: number) => Stroke {
  const across = Math.ceil((body.halfWidth * 2 + 8) / step) + 2;
  const down = Math.ceil((body.halfHeight * 2 + 8) / step) + 2;
  const left = -body.halfWidth - 4;
  const top = -body.halfHeight - 4;
  const height = new Float32Array(across * down);
  const share = new Float32Array(across * down);
  const thread = new Float32Array(across * down);
  for (let j = 0, k = 0; j < down; j += 1) {
    for (let i = 0; i < across; i += 1, k += 1) {
      const at = combed(look, left + i * step + offset, top + j * step);
      height[k] = at.height;
      share[k] = at.share;
      thread[k] = at.thread;
    }
  }
  const stroke: Stroke = { height: 0, share: 0, thread: 0 };
  return (x, y) => {
    const gx = (x - left) / step;
    const gy = (y - top) / step;
    const i = Math.floor(gx);
    const j = Math.floor(gy);
    const k = j * across + i;
    const fx = gx - i;
    const fy = gy - j;
    stroke.height = between(height, k, across, fx, fy);
    stroke.share = between(share, k, across, fx, fy);
    stroke.thread = between(thread, k, across, fx, fy);
    return stroke;
  };
}

function between(table: Float32Array, k: number, across: number, fx: number, fy: number): number {
  const a = table[k] as number;
  const b = table[k + 1] as number;
  const c = table[k + across] as number;
  const d = table[k + across + 1] as number;
  const top = a + (b - a) * fx;
  return top + (c + (d - c) * fx - top) * fy;
}
