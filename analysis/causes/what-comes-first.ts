/**
 * Moments at which something about a batch becomes known, in the order they come.
 * What is known only later than a fault can first be seen cannot have brought it.
 *
 * Source: the order of work in a soap workshop (common practice).
 */
export const MOMENTS = ['plan', 'weigh', 'lye', 'blend', 'scent-in', 'pour', 'mould', 'unmould', 'cut', 'cure', 'wrap'] as const;
export type Moment = (typeof MOMENTS)[number];

/** Position of a moment in the life of a batch: 0 for the plan. */
export function momentOrder(moment: Moment): number {
  return MOMENTS.indexOf(moment);
}

const MOMENT_OF_STAGE: Readonly<Record<string, Moment>> = {
  pour: 'pour', unmould: 'unmould', cut: 'cut',
  'cure-w1': 'cure', 'cure-w2': 'cure', 'cure-w4': 'cure', 'cure-w6': 'cure',
  release: 'wrap', 'in-use': 'wrap',
};

/** A loaf cracks from heat within hours of the pour, so how it was covered comes before it. */
const SEEN_LATER_THAN_ITS_STAGE: Readonly<Record<string, Moment>> = { 'overheating-crack': 'mould' };

/**
 * Moment at which a fault can first be seen.
 *
 * @param fault slug of the fault
 * @param firstSeen stage code, such as `unmould` or `cure-w1`
 * @throws RangeError when the stage is none of the known ones
 */
export function firstMoment(fault: string, firstSeen: string): Moment {
  const moment = SEEN_LATER_THAN_ITS_STAGE[fault] ?? MOMENT_OF_STAGE[firstSeen];
  if (moment === undefined) throw new RangeError(`firstMoment: unknown stage ${firstSeen} of fault ${fault}`);
  return moment;
}

/** Whether the input is known only after the fault can be seen, so that it cannot be its cause. */
export function comesAfter(knownAt: Moment, fault: string, firstSeen: string): boolean {
  return momentOrder(knownAt) > momentOrder(firstMoment(fault, firstSeen));
}

interface Step {
  /** Input that lies in between. */
  through: string;
  from: readonly string[];
  to: readonly string[] | 'any';
}

/**
 * What lies between inputs and faults. A step is never adjusted for when an
 * input it comes from is asked about, but it is an input of its own.
 *
 * Source: common practice for the links.
 */
const STEPS: readonly Step[] = [
  // How warm, how wet and how long follows from hot or cold: it is what the method does.
  ...['oilTemperatureC', 'lyeTemperatureC', 'scentTemperatureC', 'waterToLye', 'lyeConcentration', 'blendSeconds', 'cookMinutes', 'mouldHours', 'cutHours', 'gel', 'cover', 'trace']
    .map((through): Step => ({ through, from: ['method', 'methodFamily'], to: 'any' })),
  {
    through: 'gel',
    from: ['method', 'methodFamily', 'cover', 'mould', 'season', 'roomTemperatureC', 'humidityPct', 'oilTemperatureC', 'lyeTemperatureC', 'waterToLye', 'lyeConcentration', 'maker', 'formula', 'liquid', 'additive', 'fragranceLot'],
    to: ['soda-ash', 'glycerin-rivers', 'partial-gel-ring', 'stearic-spots', 'stuck-in-mould', 'soft-sticky', 'heat-tunnels', 'overheating-crack', 'colour-shift'],
  },
  {
    through: 'trace',
    from: ['fragranceLot', 'fragrancePct', 'maker', 'blendSeconds', 'oilTemperatureC', 'lyeTemperatureC', 'waterToLye', 'lyeConcentration', 'formula', 'fatLot'],
    to: ['air-pockets', 'uneven-bars', 'drag-marks', 'soda-ash', 'design-differs'],
  },
  {
    through: 'superfatPct',
    from: ['alkaliLot', 'maker', 'formula'],
    to: ['lye-heavy', 'crumbly', 'soft-sticky', 'orange-spots'],
  },
  { through: 'vanillinPct', from: ['fragranceLot', 'fragrancePct'], to: ['vanilla-browning', 'colour-shift'] },
  {
    through: 'waterToLye', from: ['maker'],
    to: ['soda-ash', 'glycerin-rivers', 'soft-sticky', 'warping', 'partial-gel-ring'],
  },
  { through: 'roomTemperatureC', from: ['season'], to: ['soda-ash', 'overheating-crack', 'partial-gel-ring', 'crumbly'] },
  { through: 'humidityPct', from: ['season'], to: ['sweating', 'wrap-marks'] },
];

/** Whether `between` lies on the way from the input to the fault. */
export function onThePath(between: string, input: string, fault: string): boolean {
  return STEPS.some((step) => step.through === between && step.from.includes(input) && (step.to === 'any' || step.to.includes(fault)));
}

/** Come about during the making; nobody sets them, so they may carry the effect of what was set before. */
const ARISES: ReadonlySet<string> = new Set(['gel', 'trace']);

/** Whether the value comes about by itself rather than being set by the maker. */
export function arisesByItself(input: string): boolean {
  return ARISES.has(input);
}

/** Groups of inputs that say one thing in two ways. */
const SAME_QUANTITY: readonly (readonly string[])[] = [
  ['waterToLye', 'lyeConcentration'],
  ['method', 'methodFamily'],
  // How much vanillin there is, is a property of the lot.
  ['vanillinPct', 'fragranceLot'],
];

/** Whether two inputs are one quantity written twice, so that one cannot be held still while the other moves. */
export function isSameQuantity(one: string, other: string): boolean {
  return one === other || SAME_QUANTITY.some((group) => group.includes(one) && group.includes(other));
}
