import type { FaultDefinition } from './fault-definition.ts';

export const scentFaults: readonly FaultDefinition[] = [
  {
    slug: 'scent-fade', name: 'Scent fade', otherNames: ['lost scent'],
    kind: 'functional', family: 'scent', firstSeen: 'cure-w2', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'Nothing to smell at 30 cm, or at the nose less than half of a kept reference bar of the same scent, judged by two people who do not see which is which. Usually checked at week 6.',
    severity: { 1: 'Weaker, can still be named', 2: 'Barely there', 3: 'None, or wrong' },
    lookAlikes: [
      { fault: 'off-smell', name: 'Off smell', howToTell: 'Wrong, not weak.' },
      { name: 'Covered by the base', howToTell: 'Smells of fat or lye above the scent.' },
    ],
    suspects: [
      { input: 'fragranceLot', direction: 'either', which: 'light top notes: citrus, mint; old lots' },
      { input: 'scentTemperatureC', direction: 'up' }, { input: 'method', direction: 'either', which: 'hot more' },
      { input: 'fragrancePct', direction: 'down' }, { input: 'additive', direction: 'either', which: 'clay holds it' },
    ],
    prevention: 'Cooler when the scent goes into a hot batch, heavier notes beside it, more of it within the maximum.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'seconds' },
  },
  {
    slug: 'off-smell', name: 'Off smell', otherNames: [],
    kind: 'functional', family: 'scent', firstSeen: 'cut', extentUnit: 'bars',
    occursIn: { cold: 'usual', hot: 'usual', rebatch: 'usual' },
    definition: 'Smells of fat, crayons, ammonia, burnt milk, wet dog or solvent, or not of its scent. Ammonia or solvent: ask why before going on.',
    severity: { 1: 'Gone by week 4', 2: 'Stays, weak', 3: 'Would be brought back' },
    lookAlikes: [
      { name: 'Fresh-soap smell', howToTell: 'Every bar has it in its first week.' },
      { fault: 'orange-spots', name: 'Orange spots', howToTell: 'Later, with spots.' },
    ],
    suspects: [
      { input: 'fragranceLot', direction: 'either', which: 'old lots, scents that lye changes' }, { input: 'fatLot', direction: 'either', which: 'rancid oil, unrefined neem or tallow' },
      { input: 'liquid', direction: 'up', which: 'milk too hot' }, { input: 'oilTemperatureC', direction: 'up' }, { input: 'lyeTemperatureC', direction: 'up' },
    ],
    prevention: 'Freeze the milk, refine the fat, fresh lots, a test pour.',
    usually: { 1: 'firsts', 2: 'seconds', 3: 'discarded' },
  },
];
