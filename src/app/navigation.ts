import { paths } from './paths.ts';

/** The two loaves of the main bar; only what is there stands in them. */
export const BENCH = [
  { label: 'Today', to: paths.today, key: 't' },
  { label: 'Inspect', to: paths.inspect, key: 'i' },
  { label: 'Batches', to: paths.batches, key: 'b' },
] as const;

export const DESK = [
  { label: 'Causes', to: paths.causes, key: 'c' },
  { label: 'Hot and cold', to: paths.methods, key: 'h' },
  { label: 'Lots', to: paths.lots, key: 'l' },
  { label: 'Claims', to: paths.claims, key: 'm' },
  { label: 'Import', to: paths.imports, key: 'p' },
  { label: 'Workshop', to: paths.workshop, key: 'w' },
] as const;
