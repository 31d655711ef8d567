/** Smooth step from 0 at `from` to 1 at `to`. */
export function rise(from: number, to: number, x: number): number {
  const t = (x - from) / (to - from);
  if (t <= 0) return 0;
  return t >= 1 ? 1 : t * t * (3 - 2 * t);
}

/** A bell of height 1 at 0 and width about `width`. */
export function bell(x: number, width: number): number {
  const t = (x / width) * (x / width);
  return t > 9 ? 0 : Math.exp(-t);
}

export function mix(from: number, to: number, share: number): number {
  return from + (to - from) * share;
}

/** Signed distance to a box with rounded corners that spans 0..w, 0..h; below 0 inside. */
export function boxDistance(u: number, v: number, w: number, h: number, radius: number): number {
  const dx = Math.abs(u - w / 2) - w / 2 + radius, dy = Math.abs(v - h / 2) - h / 2 + radius;
  const outside = dx > 0 || dy > 0 ? Math.sqrt(Math.max(dx, 0) ** 2 + Math.max(dy, 0) ** 2) : 0;
  return outside + Math.min(Math.max(dx, dy), 0) - radius;
}
