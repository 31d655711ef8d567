import { linear, raise, shine, smooth, stain, tint } from '../raster.ts';
import { type FaultPainter, lay, scatter, stamp } from './fault-pass.ts';

/** An open crack along the top; on a cut face it is the notch that runs down from the top. */
export const overheatingCrack: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale, offset } = pass;
  const wide = ([3.2, 6, 10] as const)[severity - 1] as number;
  const reachDown = ([0.3, 0.5, 0.75] as const)[severity - 1] as number;
  lay(pass, (k, x, y, _depth, reach) => {
    const isFace = body.side === 'face';
    const u = x + offset;
    const jag = (look.noise.cloud(isFace ? y * 0.7 : u * 0.5, 13) - 0.5) * 42 + (look.otherNoise.cloud(isFace ? y * 3 : u * 2.6, 13) - 0.5) * 9;
    const down = (y + body.halfHeight) / (2 * body.halfHeight);
    const width = isFace ? wide * scale * (1 - down / reachDown) : wide * (0.35 + 0.9 * look.noise.cloud(u * 0.6, 90));
    if (width <= 0.2) return 0;
    const from = Math.abs(isFace ? x - jag * scale * 0.6 : y - jag) / width;
    const lip = smooth(2.8, 1, from) * (from > 1 ? 1 : 0);
    const gap = smooth(1.1, 0.7, from) * reach;
    raise(raster, k, lip * 1.4 * severity * reach - gap * Math.min(body.thickness - 8, 20 + 8 * severity));
    stain(raster, k, [0.5, 0.42, 0.34], gap * 0.6);
    shine(raster, k, 0, gap);
    return gap;
  });
};

/** The mass heaved up in the middle and ran: domed, blistered, torn. */
export const volcano: FaultPainter = (pass) => {
  const { raster, body, look, severity } = pass;
  lay(pass, (k, x, y, _depth, reach) => {
    const dome = Math.max(0, 1 - Math.hypot(x / (body.halfWidth * 0.9), y / (body.halfHeight * 0.8)) ** 2) * reach;
    const blister = look.noise.cloud(x * 1.3, y * 1.3);
    raise(raster, k, dome * (6 + 7 * severity) + dome * smooth(0.4, 0.8, blister) * 7 - dome * smooth(0.9, 0.96, look.otherNoise.cloud(x * 1.8, y * 1.8)) * 20);
    stain(raster, k, [0.76, 0.66, 0.52], dome * 0.6);
    return dome;
  });
};

/** Edges that broke away at the cutter, with a dry grainy surface beside them. */
export const crumbly: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale } = pass;
  const deepest = scale * (([13, 22, 34] as const)[severity - 1] as number) * (body.side === 'top' && body.bar ? 0.6 : 1);
  lay(pass, (k, x, y, depth, reach) => {
    const bite = look.noise.cloud(x * 0.9 / scale + body.bar * 33, y * 0.9 / scale + body.bar * 21) ** 1.5 * deepest * 1.5;
    const gone = smooth(bite + 1.5, bite - 2, depth) * reach;
    const dry = smooth(bite + 16 * scale, bite, depth) * reach;
    raise(raster, k, -gone * Math.min(body.thickness * 0.75, 9 + 8 * severity) + Math.max(gone, dry * 0.4) * (look.otherNoise.cloud(x * 4, y * 4) - 0.5) * 8);
    shine(raster, k, 0, Math.max(gone, dry));
    stain(raster, k, [0.93, 0.91, 0.87], gone);
    return gone;
  });
};

/** A thumb print that stayed, with a sticky sheen round it. */
export const softSticky: FaultPainter = (pass) => {
  const { raster, severity, scale, body } = pass;
  const prints = scatter(pass, 1 + (severity > 1 ? 1 : 0), () => 0).map((disc) => ({ ...disc, x: disc.x * 0.5, y: disc.y * 0.5, radius: Math.min(scale * 21, body.halfWidth * 0.5), roundness: 0.74 }));
  stamp(pass, prints, (k, from, _disc, wx, wy) => {
    const dent = smooth(1, 0.15, from);
    const rim = Math.exp(-(((from - 1.08) / 0.14) ** 2));
    const whorl = Math.sin(Math.hypot(wx * 1.1, wy * 0.9) * 1.9 / Math.min(scale, 1.4)) * 0.32 * smooth(1, 0.8, from);
    raise(raster, k, -dent * (3.4 + 1.8 * severity) + rim * 1.3 + whorl);
    shine(raster, k, 0.75, smooth(1.4, 0.9, from));
    return Math.max(dent, rim * 0.7);
  });
};

const oil = linear('#c99a3a');

/** Free oil standing on top, or its layer low in the cut face. */
export const separation: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale } = pass;
  const share = ([0.14, 0.26, 0.42] as const)[severity - 1] as number;
  lay(pass, (k, x, y, depth, reach) => {
    const line = (look.noise.cloud(x * 0.4, 3) - 0.5) * 24 * scale;
    const pool = body.side === 'face'
      ? smooth(-2, 3, y - body.halfHeight * (1 - 2 * share) - line)
      : smooth(1 - share - 0.06, 1 - share + 0.05, look.noise.cloud(x * 0.3, y * 0.3) * 0.7 + smooth(60, 0, depth) * 0.34);
    const wet = pool * reach;
    if (wet < 0.01) return 0;
    stain(raster, k, [0.74, 0.55, 0.28], wet);
    tint(raster, k, oil, wet * 0.22);
    if (body.side !== 'face') raster.z[k] = (raster.z[k] as number) * (1 - wet) + (body.thickness + 7) * wet;
    shine(raster, k, 0.9, wet);
    return wet;
  });
};

/** Batter that stiffened before it could be poured: lumps with voids between them. */
export const seizing: FaultPainter = (pass) => {
  const { raster, look, severity, scale, body } = pass;
  lay(pass, (k, x, y, _depth, reach) => {
    const u = x / scale + body.bar * 3;
    const cell = look.noise.veins(u * 1.1 + look.noise.cloud(u, y / scale) * 20, (y / scale) * 1.1);
    const gap = smooth(0.16, 0.03, cell) * reach;
    const heap = Math.sqrt(Math.min(1, cell)) * reach;
    raise(raster, k, heap * (3 + 4 * severity) - gap * 8 + (look.otherNoise.cloud(x * 2, y * 2) - 0.5) * 6 * reach);
    stain(raster, k, [0.6, 0.54, 0.46], gap * 0.7);
    shine(raster, k, 0.05, reach);
    return reach * 0.8;
  });
};

/** A thick pour: spooned in, its peaks standing. */
export const acceleration: FaultPainter = (pass) => {
  const { raster, look, severity, body } = pass;
  const strength = body.side === 'face' ? 0.25 : 1;
  lay(pass, (k, x, y, _depth, reach) => {
    const peak = Math.abs(look.noise.cloud(x * 0.8 + 40, y * 0.8) - 0.5) * 2;
    raise(raster, k, ((1 - peak) ** 2 * 13 + (look.otherNoise.cloud(x * 1.8, y * 1.8) - 0.5) * 7) * (0.35 + 0.3 * severity) * reach * strength);
    shine(raster, k, 0.14, reach * 0.8);
    return reach * 0.7;
  });
};

/** A dry, chalky, paler surface with a few hair cracks. */
export const chalky: FaultPainter = (pass) => {
  const { raster, look, severity, scale } = pass;
  lay(pass, (k, x, y, _depth, reach) => {
    const dry = smooth(0.2, 0.7, look.noise.cloud(x * 0.4, y * 0.4)) * reach;
    const bend = look.noise.cloud(x / scale, y / scale) * 60;
    const hair = smooth(0.03, 0.008, look.otherNoise.veins(x / scale * 0.8 + bend, y / scale * 0.8 + bend * 0.6)) * smooth(0.3, 0.6, dry) * reach;
    tint(raster, k, [0.8, 0.79, 0.76], dry * 0.16 * severity);
    stain(raster, k, [0.6, 0.56, 0.5], hair * 0.5);
    raise(raster, k, -hair * 2);
    return Math.max(dry, hair);
  });
};

/** Small holes that hold clear liquid, with a white crust round them. */
export const lyePockets: FaultPainter = (pass) => {
  const { raster, severity, scale } = pass;
  stamp(pass, scatter(pass, 4 + 5 * severity, (r) => scale * r.between(2.5, 5 + severity * 2)), (k, from) => {
    const inside = smooth(1.05, 0.8, from);
    const crust = Math.exp(-(((from - 1.15) / 0.2) ** 2));
    raise(raster, k, -inside * 6 + crust * 0.8);
    stain(raster, k, [0.6, 0.58, 0.54], inside);
    tint(raster, k, [0.88, 0.88, 0.86], crust * 0.8);
    shine(raster, k, 1.2, inside);
    return Math.max(inside, crust);
  });
};

/** A gap along a chunk that lets go of the soap round it. */
export const embedDetachment: FaultPainter = (pass) => {
  const { raster, body, look, severity, scale } = pass;
  const chunk = scatter(pass, 1, () => 0).map((disc) => ({ ...disc, x: disc.x * 0.4, y: disc.y * 0.4, radius: Math.min(34 * scale, body.halfWidth * 0.5), roundness: 0.72 }));
  stamp(pass, chunk, (k, from) => {
    tint(raster, k, look.third, smooth(1, 0.96, from) * 0.85);
    const gap = Math.exp(-(((from - 1) / (0.03 + 0.02 * severity)) ** 2));
    raise(raster, k, -gap * 9);
    stain(raster, k, [0.35, 0.3, 0.26], gap * 0.8);
    return Math.max(gap, smooth(1.05, 1, from) * 0.5);
  });
};
