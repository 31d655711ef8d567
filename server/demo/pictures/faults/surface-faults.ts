import { linear, raise, shine, smooth, stain, tint } from '../raster.ts';
import { combedOver } from '../surfaces/comb-table.ts';
import { type FaultPainter, lay, scatter, stamp } from './fault-pass.ts';

const ash = linear('#eceeed');

/** A pale matt film; thickest on the ridges of a top, on a cut face it creeps in from the edges. */
export const sodaAsh: FaultPainter = (pass) => {
  const { raster, body, look, severity, offset } = pass;
  const cover = ([0.36, 0.6, 0.86] as const)[severity - 1] as number;
  const isFace = body.side === 'face';
  const ridgeAt = isFace ? () => ({ height: 0 }) : combedOver(look, body, offset);
  lay(pass, (k, x, y, depth, reach) => {
    const u = x + offset;
    const place = look.otherNoise.cloud(u * 0.28 + body.bar * 13, y * 0.28) * 0.66 + look.noise.cloud(u * 1.1, y * 1.1) * 0.34;
    const favour = isFace ? smooth(60 * pass.scale, 0, depth) * 0.5 - 0.2 : (ridgeAt(x, y).height - 0.4) * 0.3;
    const film = smooth(1 - cover - 0.06, 1 - cover + 0.2, place + favour) * reach;
    if (film < 0.01) return 0;
    const powder = 0.62 + 0.38 * look.noise.grain(x * 0.9, y * 0.9);
    const share = film * powder * (0.46 + 0.14 * severity);
    tint(raster, k, ash, share);
    raise(raster, k, film * (0.3 + 1.1 * look.otherNoise.grain(x * 1.1, y * 1.1)) * (0.4 + 0.3 * severity));
    shine(raster, k, 0, film);
    return film;
  });
};

/** Clear droplets standing on the surface, with a wet sheen under them. */
export const sweating: FaultPainter = (pass) => {
  const { raster, severity, scale, body } = pass;
  const area = (body.halfWidth * body.halfHeight) / 13_000 / (scale * scale);
  const discs = scatter(pass, Math.round(area * (([26, 60, 120] as const)[severity - 1] as number)), (r) => scale * (1.8 + 5.2 * r.unit() ** 2));
  for (const disc of discs) { disc.roundness = Math.max(0.86, disc.roundness); }
  lay(pass, (k, _x, _y, _depth, reach) => { shine(raster, k, 0.62, 0.5 * reach); return 0; });
  stamp(pass, discs, (k, from, disc) => {
    if (from > 1) { stain(raster, k, [0.86, 0.86, 0.86], smooth(1.35, 1, from)); return 0; }
    raise(raster, k, Math.sqrt(1 - from * from) * disc.radius * 0.75);
    stain(raster, k, [0.82, 0.81, 0.78], 0.8);
    shine(raster, k, 1.6, 1);
    return 1;
  });
};

/** Prints of a wrapper: a dull band, its edges and a faint grid. */
export const wrapMarks: FaultPainter = (pass) => {
  const { raster, severity, scale, body } = pass;
  const half = 44 * scale;
  lay(pass, (k, x, y, _depth, reach) => {
    const inBand = smooth(half + 2, half - 2, Math.abs(x + y * 0.06));
    const line = smooth(3.4, 0.8, Math.abs(Math.abs(x + y * 0.06) - half));
    const grid = inBand * Math.max(smooth(0.78, 0.95, Math.sin(x * 0.62 / scale)), smooth(0.78, 0.95, Math.sin((y + body.bar) * 0.62 / scale)));
    raise(raster, k, -(line * 2.2 + grid * 0.55 + inBand * 0.5) * reach * (0.5 + 0.3 * severity));
    shine(raster, k, 0.02, inBand * reach);
    stain(raster, k, [0.84, 0.85, 0.86], inBand * reach * 0.22 * severity);
    return Math.max(inBand * 0.8, line) * reach;
  });
};

/** Tears where soap stayed on the liner: a rough hollow in a corner. */
export const stuckInMould: FaultPainter = (pass) => {
  const { raster, body, look, severity, random, scale, reach } = pass;
  const sideX = random.chance(0.5) ? -1 : 1;
  const sideY = random.chance(0.5) ? -1 : 1;
  const size = scale * (([34, 58, 92] as const)[severity - 1] as number) * (body.bar === 0 ? 1.5 : 1);
  const deep = Math.min(body.thickness * 0.7, 10 + 9 * severity);
  // On an uncut loaf the tear is on the side of the bars that will carry it.
  const middles = Array.from({ length: 21 }, (_, i) => ((i - 10) / 10) * body.halfWidth).filter((x) => reach(x) > 0.9);
  const corner = body.bar === 0 && middles.length < 21 ? (middles[Math.floor(middles.length / 2)] ?? 0) : sideX * body.halfWidth;
  lay(pass, (k, x, y) => {
    const from = Math.hypot((corner - x) * (body.bar && body.side === 'top' ? 1.6 : 1), (sideY * body.halfHeight - y) * 1.1) / size;
    const torn = smooth(1.04, 0.94, from + (look.noise.cloud(x * 1.2, y * 1.2) - 0.5) * 0.5);
    if (torn <= 0) return 0;
    raise(raster, k, -torn * deep * (1.25 - from * 0.6) + torn * (look.otherNoise.cloud(x * 3, y * 3) - 0.5) * 9);
    shine(raster, k, 0, torn);
    stain(raster, k, [0.9, 0.88, 0.85], torn);
    return torn;
  });
};

/** Smears and torn furrows along the way the cutter went. */
export const dragMarks: FaultPainter = (pass) => {
  const { raster, body, look, severity, random, scale } = pass;
  const lines = Array.from({ length: 3 + severity * 4 }, () => ({
    at: random.between(-0.9, 0.9) * (body.side === 'top' ? body.halfWidth : body.halfHeight), deep: random.between(0.4, 1) * (1.2 + severity * 1.1), wide: scale * random.between(1.2, 2.6 + severity * 0.6),
    from: random.between(-1.1, -0.1), until: random.between(0.2, 1.1),
  }));
  lay(pass, (k, x, y, _depth, reach) => {
    const isTop = body.side === 'top';
    const along = isTop ? y / body.halfHeight : x / body.halfWidth;
    const across = (isTop ? x : y) + (look.noise.cloud(along * 40, 5) - 0.5) * 5 * scale;
    let deepest = 0;
    for (const line of lines) {
      const d = Math.abs(across - line.at) / line.wide;
      if (d > 2.6 || along < line.from || along > line.until) continue;
      const furrow = Math.exp(-d * d) * line.deep * smooth(line.from, line.from + 0.12, along);
      const burr = Math.exp(-((d - 1.7) ** 2) * 3) * line.deep * 0.4;
      raise(raster, k, (burr - furrow * (0.7 + 0.6 * look.otherNoise.grain(x * 0.7, y * 0.7))) * reach);
      stain(raster, k, [0.75, 0.72, 0.68], Math.min(1, furrow * 0.22) * reach);
      deepest = Math.max(deepest, furrow / line.deep);
    }
    return deepest;
  });
};
