import type { ReactNode } from 'react';
import type { FaultView } from '#shared/faults.ts';

type Family = FaultView['family'];

/** Outline of each family of faults, in a square of 24. */
export const OUTLINES: Record<Family, string> = {
  surface: 'M2.5 21V11.5C2.5 6 7 3 12 3s9.5 3 9.5 8.5V21z',
  structure: 'M3 3h18v18H3z',
  pour: 'M12 1.5C14.5 6.5 21.5 9.6 21.5 15.2 21.5 19.6 17.4 22.5 12 22.5S2.5 19.6 2.5 15.2C2.5 9.6 9.5 6.5 12 1.5z',
  colour: 'M12 1.8a10.2 10.2 0 1 0 0 20.4a10.2 10.2 0 1 0 0-20.4z',
  scent: 'M12 .8 23.2 12 12 23.2.8 12z',
  safety: 'M7 2.2h10L22.8 12 17 21.8H7L1.2 12z',
};

const dots = (places: readonly (readonly [number, number, number])[]) => places.map(([x, y, r]) => <circle key={`${x} ${y}`} cx={x} cy={y} r={r} className="fill-current stroke-none" />);

/** Pattern of each fault inside its family's outline. */
export const PATTERNS: Record<string, ReactNode> = {
  'soda-ash': <>{dots([[7.5, 9.5, 1.3], [12, 7.2, 1.3], [16.5, 9.5, 1.3], [9.8, 12, 1], [14.3, 12, 1]])}<path d="M3 16.5h18"/></>,
  'sweating': <><path d="M8 9c1.3 2 1.6 2.6 1.6 3.4a1.6 1.6 0 0 1-3.2 0C6.4 11.6 6.7 11 8 9z" className="fill-current stroke-none"/><path d="M15.5 9.5c1.3 2 1.6 2.6 1.6 3.4a1.6 1.6 0 0 1-3.2 0c0-.8.3-1.4 1.6-3.4z" className="fill-current stroke-none"/><path d="M3 18h18"/></>,
  'drag-marks': <><path d="M6 10h12M5 13.5h9M7 17h11"/></>,
  'glycerin-rivers': <><path d="M6.5 4c0 4 4 4.5 4 8s-3.5 4-3.5 8M10.5 12c3 0 3.5-3 7-3.5M10 14.5c3 .5 4 3 4 5.5"/></>,
  'partial-gel-ring': <><ellipse cx="12" cy="12" rx="5.5" ry="5.2"/><ellipse cx="12" cy="12" rx="2" ry="1.8" className="fill-current stroke-none"/></>,
  'air-pockets': <><circle cx="8.5" cy="9" r="2"/><circle cx="15.5" cy="8" r="1.2"/><circle cx="14" cy="15" r="3"/><circle cx="7.5" cy="16" r="1"/></>,
  'overheating-crack': <><path d="M12 3l-2 4.5 4 3.5-3.5 4 2.5 6"/></>,
  'stearic-spots': <>{dots([[8, 8, 1.1], [15, 7.5, 1.1], [11.5, 12, 1.1], [7.5, 16, 1.1], [16, 15.5, 1.1]])}</>,
  'soft-sticky': <><path d="M6.5 8c2 5 9 5 11 0M6.5 16h11"/></>,
  'ricing': <><path d="M8 13l2-1.5M13.5 11.5l1.8 1.8M9.5 17.5l2 1M14.5 17l2-1M12 14.5l.5 1.5" strokeWidth="2.2"/></>,
  'acceleration': <><path d="M6.5 18c5 0 8-1.5 9.5-7.5M16.5 14.5l-.4-4.5-4 2"/></>,
  'seizing': <><path d="M7.5 12.5h9v6h-9z" className="fill-current stroke-none"/><path d="M12 7.5v5"/></>,
  'separation': <><path d="M5 14c2.3-1.5 4.7 1.5 7 0s4.7 1.5 7 0M6 18h12"/></>,
  'colour-shift': <><path d="M12 1.8a10.2 10.2 0 0 1 0 20.4z" className="fill-current stroke-none"/></>,
  'vanilla-browning': <><path d="M3.5 8.5h17M2 12h20M3.5 15.5h17M7 19h10"/></>,
  'colour-bleed': <><path d="M12 2v20M14.5 6.5h3M14.5 12h5M14.5 17.5h3"/></>,
  'orange-spots': <>{dots([[8.5, 9, 2.3], [15.5, 11, 1.5], [11, 16, 1.9]])}</>,
  'scent-fade': <><path d="M7.5 15c0-4 4-4 4-7.5M12 17c0-2.5 2.8-3 2.8-5.5" strokeDasharray="2 1.8"/></>,
  'off-smell': <><path d="M8 15.5c0-4 3.5-4 3.5-8M13 16.5c0-4 3.2-4 3.2-7.5M6.5 12h11"/></>,
  'lye-heavy': <><path d="M12 6c2.8 4.2 4 6 4 7.8a4 4 0 0 1-8 0C8 12 9.2 10.2 12 6z" className="fill-current stroke-none"/></>,
  'lye-pockets': <><circle cx="9" cy="10" r="2.2" className="fill-current stroke-none"/><circle cx="15" cy="14.5" r="2.6"/></>,
  'false-trace': <><path d="M6.5 13.5h11M8 17h8M12 9l-2.5 2.5M12 9l2.5 2.5"/></>,
  'volcano': <><path d="M7.5 18l2.5-6h4l2.5 6M12 9V5.5M8.5 8.5L7 6M15.5 8.5L17 6"/></>,
  'foreign-matter': <><path d="M8 16c2-6 4 2 5-4s2.5-3 3.5-4"/></>,
  'heat-tunnels': <><path d="M5.5 9c3-3 4 3 7 0s4 2 6 0M5.5 15c3-3 4 3 7 0s4 2 6 0"/></>,
  'crumbly': <><path d="M3 14l4-2 3 3 4-4 3 3 4-3M8 18.5h1.5M14 17.5h1.5"/></>,
  'uneven-bars': <><path d="M7 19V8M12 19V5.5M17 19v-8"/></>,
  'embed-detachment': <><path d="M8 8h7v7H8z"/><path d="M17.5 12v5.5H12"/></>,
  'warping': <><path d="M5 17c3.5-5 10.5-5 14 0"/></>,
  'stuck-in-mould': <><path d="M6 12l3 3 3-3 3 3 3-3M3 18.5h18"/></>,
  'wrap-marks': <><path d="M9 5v15M15 5v15M3 14h18"/></>,
  'colour-specks': <>{dots([[8, 8, 1], [12, 6.5, 0.9], [16, 9, 1], [9, 13, 0.9], [14, 13, 1], [11, 17, 0.9], [16, 16, 0.9]])}</>,
};

/** Family of a catalogue fault, for marks drawn before the catalogue is there. */
export const FAMILY_OF: Record<string, Family> = {
  'soda-ash': 'surface',
  'sweating': 'surface',
  'drag-marks': 'surface',
  'glycerin-rivers': 'structure',
  'partial-gel-ring': 'structure',
  'air-pockets': 'structure',
  'overheating-crack': 'structure',
  'stearic-spots': 'structure',
  'soft-sticky': 'structure',
  'ricing': 'pour',
  'acceleration': 'pour',
  'seizing': 'pour',
  'separation': 'pour',
  'colour-shift': 'colour',
  'vanilla-browning': 'colour',
  'colour-bleed': 'colour',
  'orange-spots': 'colour',
  'scent-fade': 'scent',
  'off-smell': 'scent',
  'lye-heavy': 'safety',
  'lye-pockets': 'safety',
  'false-trace': 'pour',
  'volcano': 'safety',
  'foreign-matter': 'safety',
  'heat-tunnels': 'structure',
  'crumbly': 'structure',
  'uneven-bars': 'structure',
  'embed-detachment': 'structure',
  'warping': 'surface',
  'stuck-in-mould': 'surface',
  'wrap-marks': 'surface',
  'colour-specks': 'colour',
};
