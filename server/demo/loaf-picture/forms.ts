import { randomOf } from '../random.ts';
import { boxDistance } from './curves.ts';
import { topHeightMm } from './design.ts';
import { barsWith } from './layout.ts';
import type { Look } from './look.ts';
import { at, fields } from './noise.ts';
import type { Outline } from './body.ts';
import { type Patch, pictureOf } from './sheet.ts';
import type { LoafPictureSpec } from './spec.ts';

/** What faults do to the form of one bar (0: of the whole loaf); 0 everywhere for a good one. */
export interface Form {
  /** Bow of the bar, in units at its ends. */
  bow: number;
  /** How far its edges are broken off, in units. */
  crumbled: number;
  /** Share by which it is too thin or too thick. */
  uneven: number;
  /** How the batter was pressed or spooned instead of poured: 0..1. */
  spooned: number;
  seed: number;
  /** Distance beyond the torn corner; below 0 where soap is left. */
  tornAt: (u: number, v: number, w: number, h: number) => number;
  /** The patch where and how large it really is. */
  placed: (patch: Patch) => Patch;
}

export function formOf(spec: LoafPictureSpec, look: Look, bar: number): Form {
  const grade = (slug: string) => {
    const fault = spec.faults.find((f) => f.slug === slug);
    return fault && (bar === 0 || barsWith(fault, spec).includes(bar)) ? fault.severity : 0;
  };
  const r = randomOf(7, 'form', spec.batchCode, bar);
  const sign = r.chance(0.5) ? 1 : -1;
  const uneven = grade('uneven-bars') > 0 ? sign * (0.04 + 0.05 * grade('uneven-bars')) : 0;
  const torn = grade('stuck-in-mould'), { cloud } = fields(), { ox, oy } = look.character;
  const size = torn * 26 + 12;
  const heard = Math.max(...spec.faults.map((f) => (f.slug === 'seizing' ? 0.4 + 0.2 * f.severity : f.slug === 'acceleration' ? 0.25 * f.severity : 0)), 0);
  return {
    bow: grade('warping') * 4.2, crumbled: grade('crumbly') * 4.5, uneven, spooned: heard, seed: r.unit() * 512,
    tornAt: (u, v, w, h) => (torn === 0 ? -1e3 : size - Math.hypot(u * 0.8, (h - v) * 1.15) + (at(cloud, u * 1.5 + ox, v * 1.5 + oy + bar * 33) - 0.5) * 34 + w * 0),
    placed: (patch) => {
      const w = patch.w * (1 + (uneven < 0 ? uneven * 1.6 : 0)), h = patch.h * (1 + Math.min(0, uneven) * 0.4);
      const turn = grade('warping') > 0 ? sign * 0.008 * grade('warping') : 0, { ax, ay } = patch;
      return { ...patch, w, h, ...pictureOf(patch, patch.w / 2, patch.h / 2), ax: { x: ax.x - turn * ax.y, y: ax.y + turn * ax.x }, ay: { x: ay.x - turn * ay.y, y: ay.y + turn * ay.x } };
    },
  };
}

/** Outline of a bar as it lies on the board: three straight sides, the worked top, and what is missing of it. */
export function outlineOf(form: Form, patch: Patch, look: Look): Outline {
  const { cloud, lumps, slow } = fields();
  const { w, h } = patch, c = look.character, isFace = patch.kind === 'face';
  const alongMm = patch.bar * 21, crest = h / 65;
  const profile = new Float32Array(Math.ceil(w) + 30);
  if (isFace) {
    for (let i = 0; i < profile.length; i += 1) {
      const x = ((i - 14) / w) * 80;
      profile[i] = x > 0 && x < 80 ? (6.2 - topHeightMm(c, alongMm, x)) * crest : 6 * crest;
    }
  }
  return (u, v) => {
    const across = (u / w) * 2 - 1, bent = isFace ? v - form.bow * (across * across - 0.35) : v;
    const top = isFace ? (profile[Math.min(profile.length - 1, Math.max(0, Math.round(u + 14)))] as number) + (form.uneven < 0 ? -form.uneven * h : 0) : 0;
    const tilt = isFace && form.uneven > 0 ? form.uneven * h * (u / w) : 0;
    const side = form.bow > 0 && !isFace ? form.bow * 0.35 * (((v / h) * 2 - 1) ** 2 - 0.35) : 0;
    let d = boxDistance(u - side, bent - top - tilt, w, h - top - tilt, isFace ? 5 : 3);
    d += (at(slow, u * 1.4 + patch.id * 77, v * 1.4) - 0.5) * 1.6 + (look.rustic > 0 ? (at(cloud, u * 1.2, v * 1.2 + patch.id * 31) - 0.5) * 3 * look.rustic : 0);
    if (form.crumbled > 0 && d > -40) d += Math.max(0, (at(lumps, u * 0.8 + form.seed, v * 0.8) - 0.5) * 5.2 * form.crumbled + (at(lumps, u * 2.1, v * 2.1 + form.seed) - 0.5) * 5);
    if (isFace) d = Math.max(d, form.tornAt(u, v, w, h));
    return d;
  };
}
