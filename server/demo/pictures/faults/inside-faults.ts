import { type Colour, linear, mix, raise, shine, smooth, stain, tint } from '../raster.ts';
import { type FaultPainter, lay, scatter, stamp } from './fault-pass.ts';

const pale = linear('#f4eedd');
const wax = linear('#f6f3e8');

/** Translucent darker veins through the body, like a cracked glaze. */
export const glycerinRivers: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale, offset } = pass;
  const strength = ([0.42, 0.62, 0.8] as const)[severity - 1] as number;
  const coverage = ([0.5, 0.7, 0.92] as const)[severity - 1] as number;
  lay(pass, (k, x, y, _depth, reach) => {
    const u = (x / scale + body.bar * 7 + offset) * 1.05;
    const v = (y / scale) * 1.05;
    const bx = (look.noise.cloud(u * 0.8, v * 0.8) - 0.5) * 34;
    const by = (look.otherNoise.cloud(u * 0.8, v * 0.8) - 0.5) * 34;
    const wide = 0.05 + 0.06 * look.noise.cloud(u * 0.4 + 9, v * 0.4);
    const thick = smooth(wide * 1.7, wide * 0.35, look.noise.veins(u + bx, v + by));
    const fine = smooth(0.075, 0.02, look.otherNoise.veins(u * 2 + bx, v * 2 + by)) * 0.5;
    const where = smooth(1 - coverage - 0.12, 1 - coverage + 0.12, look.otherNoise.cloud(u * 0.3 + 70, v * 0.3));
    const vein = Math.max(thick, fine) * where * reach;
    if (vein < 0.01) return 0;
    stain(raster, k, [0.62, 0.5, 0.34], vein * strength);
    shine(raster, k, 0.5, vein * 0.8);
    raise(raster, k, -vein * 0.7);
    return vein;
  });
};

/** Hard pale grains in the batter. */
export const ricing: FaultPainter = (pass) => {
  const { raster, body, severity, scale } = pass;
  const area = (body.halfWidth * body.halfHeight) / 13_000 / (scale * scale);
  const grains = scatter(pass, Math.round(area * (([46, 120, 260] as const)[severity - 1] as number)), (r) => scale * (1.3 + 2.7 * r.unit() ** 1.6));
  stamp(pass, grains, (k, from) => {
    const grain = smooth(1.12, 0.78, from);
    stain(raster, k, [0.72, 0.68, 0.6], smooth(1.5, 1.15, from) * (1 - grain) * 0.6);
    tint(raster, k, pale, grain * 0.9);
    raise(raster, k, grain * (0.7 + 0.3 * severity));
    shine(raster, k, 0.03, grain);
    return grain;
  });
  if (severity === 3) lay(pass, (k, x, y, _d, reach) => { raise(raster, k, (pass.look.otherNoise.cloud(x * 3, y * 3) - 0.5) * 3.6 * reach); return 0; });
};

/** Round waxy white dots flush with the surface. */
export const stearicSpots: FaultPainter = (pass) => {
  const { raster, body, severity, scale } = pass;
  const area = (body.halfWidth * body.halfHeight) / 13_000 / (scale * scale);
  const dots = scatter(pass, Math.round(area * (([14, 34, 70] as const)[severity - 1] as number)), (r) => scale * r.between(2.2, 5.4));
  for (const dot of dots) dot.roundness = 0.95;
  stamp(pass, dots, (k, from) => {
    const dot = smooth(1.15, 0.85, from);
    stain(raster, k, [0.7, 0.67, 0.6], Math.exp(-(((from - 1.15) / 0.18) ** 2)) * 0.7);
    tint(raster, k, wax, dot * 0.86);
    shine(raster, k, 0.3, dot);
    return dot;
  });
};

const hollow: Colour = [0.44, 0.4, 0.36];

/** Dry holes with dull walls, from pinholes to voids. */
export const airPockets: FaultPainter = (pass) => {
  const { raster, body, severity, scale } = pass;
  const area = (body.halfWidth * body.halfHeight) / 13_000 / (scale * scale);
  const largest = ([4.5, 9, 17] as const)[severity - 1] as number;
  const holes = scatter(pass, Math.round(area * (([16, 24, 32] as const)[severity - 1] as number)), (r) => scale * (1.3 + largest * r.unit() ** 3.2));
  stamp(pass, holes, (k, from, hole) => {
    if (from > 1.12) { raise(raster, k, smooth(1.5, 1.12, from) * 0.5); return 0; }
    const inside = smooth(1.12, 0.82, from);
    raise(raster, k, -inside * Math.min(body.thickness - 6, hole.radius * 1.7) * (1 - 0.3 * from * from));
    stain(raster, k, hollow, inside * 0.7);
    shine(raster, k, 0, inside);
    return inside;
  });
};

/** A darker, glassier oval whose edge runs parallel to the mould. */
export const partialGelRing: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale, random } = pass;
  const size = 0.62 + random.normal(0, 0.03);
  const depthOf = ([0.3, 0.48, 0.66] as const)[severity - 1] as number;
  const upright = body.side === 'face';
  lay(pass, (k, x, y, _depth, reach) => {
    const lx = Math.abs(x / body.halfWidth) / (body.bar === 0 ? 0.92 : size);
    const ly = Math.abs((y - (upright ? 8 * scale : 0)) / body.halfHeight) / size;
    // Between a circle and the mould's square: a rounded oval.
    const round = body.side === 'top' && body.bar > 0 ? ly : (lx ** 2.5 + ly ** 2.5) ** 0.4;
    const from = round + (look.noise.cloud(x * 0.3 / scale + body.bar * 6, y * 0.3 / scale) - 0.5) * 0.14;
    const inside = smooth(1.02, 0.97, from) * reach;
    const line = Math.exp(-(((from - 1) / 0.03) ** 2)) * reach;
    stain(raster, k, [0.5, 0.43, 0.34], inside * depthOf);
    stain(raster, k, [0.55, 0.42, 0.28], line * 0.5 * depthOf);
    shine(raster, k, 0.6, inside * 0.6);
    return Math.max(inside, line);
  });
};

/** Long smooth-walled channels; on the top folds like those of a brain. */
export const heatTunnels: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale, offset } = pass;
  const coverage = ([0.3, 0.48, 0.7] as const)[severity - 1] as number;
  lay(pass, (k, x, y, _depth, reach) => {
    const u = x / scale + body.bar * 5 + offset;
    const v = y / scale;
    const fold = Math.abs(look.noise.cloud(u * 0.5 + (look.otherNoise.cloud(u * 0.4, v * 0.4) - 0.5) * 60, v * 0.62) - 0.5);
    const where = smooth(1 - coverage - 0.08, 1 - coverage + 0.1, look.otherNoise.cloud(u * 0.36 + 20, v * 0.36 + 20));
    const channel = smooth(0.085, 0.035, fold) * where * reach;
    raise(raster, k, -channel * (7 + 4 * severity) * Math.min(1.6, scale) + (smooth(0.2, 0.09, fold) - channel) * where * 2.5 * reach);
    stain(raster, k, mix([0.55, 0.45, 0.33], [1, 1, 1], 0.2), channel * 0.75);
    shine(raster, k, 0.5, channel);
    return channel;
  });
};
