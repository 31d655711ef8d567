import { type Colour, linear, raise, shine, smooth, stain, tint } from '../raster.ts';
import { combed } from '../surfaces/top.ts';
import { type FaultPainter, lay, scatter, stamp } from './fault-pass.ts';

const rust = linear('#b5601a');
const rustDeep = linear('#7d3a0c');

/** Tan to dark brown wherever the scent is, from the surface inwards; deepens over the weeks. */
export const vanillaBrowning: FaultPainter = (pass) => {
  const { raster, body, look, severity, ageDays, scale, offset } = pass;
  const grown = 0.74 + 0.26 * smooth(0, 24, ageDays);
  const depthOf = (([0.36, 0.62, 0.86] as const)[severity - 1] as number) * grown;
  lay(pass, (k, x, y, depth, reach) => {
    const u = (x + offset) / scale;
    const rim = smooth(46 * scale, 4, depth + (look.noise.cloud(u * 0.6, y * 0.6 / scale) - 0.5) * 34 * scale);
    const patch = 0.72 + 0.28 * look.otherNoise.cloud(u * 0.3 + body.bar * 9, y * 0.3 / scale);
    const share = depthOf * reach * patch * (0.62 + 0.38 * Math.max(rim, smooth(10, 40, ageDays)));
    stain(raster, k, [0.46, 0.27, 0.13], share);
    return share > 0.12 ? 1 : 0;
  });
};

/** Orange to brown discs with a fuzzy edge, growing while the bars wait. */
export const orangeSpots: FaultPainter = (pass) => {
  const { raster, body, severity, ageDays, scale } = pass;
  const area = (body.halfWidth * body.halfHeight) / 13_000 / (scale * scale);
  const grown = 0.6 + 0.4 * smooth(21, 70, ageDays);
  const spots = scatter(pass, Math.max(2, Math.round(area * (([4, 8, 15] as const)[severity - 1] as number))), (r) => scale * grown * (3 + (5 + 5 * severity) * r.unit() ** 1.8));
  stamp(pass, spots, (k, from) => {
    const halo = smooth(1.6, 0.3, from);
    const heart = smooth(0.9, 0.1, from);
    tint(raster, k, rust, halo * 0.66);
    tint(raster, k, rustDeep, heart * 0.5);
    shine(raster, k, 0.4, heart);
    return halo;
  });
};

/** The whole colour off its target: towards grey-green or dull brown. */
export const colourShift: FaultPainter = (pass) => {
  const { raster, look, severity, random } = pass;
  const filter = random.pick<Colour>([[0.72, 0.86, 0.78], [0.9, 0.72, 0.62], [0.7, 0.78, 0.95]]);
  const share = ([0.4, 0.66, 0.95] as const)[severity - 1] as number;
  lay(pass, (k, x, y, _depth, reach) => { stain(raster, k, filter, share * reach * (0.9 + 0.1 * look.noise.cloud(x, y))); return reach; });
};

/** A fuzzy halo of the second colour creeping into its neighbour. */
export const colourBleed: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale, offset } = pass;
  const strength = ([0.4, 0.6, 0.8] as const)[severity - 1] as number;
  lay(pass, (k, x, y, _depth, reach) => {
    const u = (x + offset) / scale + body.bar * 9;
    const v = y / scale + body.bar * 4;
    const blot = body.side === 'face'
      ? smooth(0.42, 0.7, look.noise.cloud(u * 0.26, v * 0.26) * 0.75 + look.otherNoise.cloud(u * 0.7, v * 0.7) * 0.25)
      : smooth(0.3, 0.75, look.noise.cloud(u * 0.3, v * 0.3)) * (0.5 + 0.5 * combed(look, u, v).share);
    tint(raster, k, look.second, blot * strength * reach * 0.8);
    return blot * reach;
  });
};

/** A wedge of the second colour where the design has none: the pour went another way. */
export const designDiffers: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale, offset } = pass;
  lay(pass, (k, x, y, _depth, reach) => {
    const edge = y * 0.8 - x * 0.5 + (look.noise.cloud((x + offset) * 0.5 / scale, y * 0.5 / scale) - 0.5) * 70 * scale;
    const wedge = smooth(-2, 2, edge - (30 - 18 * severity) * scale) * smooth(body.halfHeight * 0.98, body.halfHeight * 0.9, Math.abs(y)) * reach;
    tint(raster, k, look.second, wedge * 0.78);
    return wedge;
  });
};

/** Points of pure colour that were never worked in. */
export const colourSpecks: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale } = pass;
  const area = (body.halfWidth * body.halfHeight) / 13_000 / (scale * scale);
  const pure: Colour = [look.second[0] ** 1.6 * 0.8, look.second[1] ** 1.6 * 0.8, look.second[2] ** 1.6 * 0.8];
  const specks = scatter(pass, Math.round(area * (([18, 44, 90] as const)[severity - 1] as number)), (r) => scale * (0.9 + 2 * r.unit() ** 2));
  stamp(pass, specks, (k, from, _disc, wx, wy) => {
    const speck = smooth(1.2, 0.7, from);
    const streak = severity > 1 && wx > 0 && Math.abs(wy) < 1.2 ? smooth(1.6, 0.8, from) * 0.5 : 0;
    tint(raster, k, pure, Math.max(speck, streak) * 0.92);
    return speck;
  });
};

/** One thing that is in no formula: a dark bristle, curled. */
export const foreignMatter: FaultPainter = (pass) => {
  const { raster, severity, scale, random } = pass;
  const bits = scatter(pass, severity, () => scale * 7);
  const bend = random.between(-0.16, 0.16);
  const at = bits.length > 0 ? bits : [{ x: 0, y: 0, radius: scale * 7, angle: 0.4, roundness: 1 }];
  stamp(pass, at.map((bit) => ({ ...bit, radius: scale * 15, roundness: 1 })), (k, _from, disc, wx, wy) => {
    const along = wx * Math.cos(disc.angle) + wy * Math.sin(disc.angle);
    const across = wy * Math.cos(disc.angle) - wx * Math.sin(disc.angle) - bend * along * along * 0.09;
    const bristle = smooth(1.25, 0.5, Math.abs(across) / (1.1 * scale)) * smooth(15 * scale, 14 * scale, Math.abs(along));
    tint(raster, k, [0.015, 0.013, 0.012], bristle * 0.95);
    raise(raster, k, bristle * 2.2);
    return bristle;
  });
};
