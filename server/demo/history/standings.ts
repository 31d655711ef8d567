import { addDays } from '#shared/units/days.ts';
import { weekOf } from './calendar.ts';
import type { StandingChange } from './types.ts';

/** Who put a lot on hold or gave it back, when and why. */
export function quernbyStandings(code: string, startsOn: string): StandingChange[] {
  const on = (week: number, day: number) => addDays(weekOf(startsOn, week), day);
  if (code === 'EF-7802') {
    return [
      { on: on(39, 1), by: 'benedikt', before: 'in-use', after: 'on-hold', reason: 'Nearly every cold loaf with this drum went thick, four had rice. Nothing more with it until Ilse has looked.' },
      { on: on(40, 2), by: 'ilse', before: 'on-hold', after: 'hot-process-only', reason: 'All hot batches with it were fine. Cold is over for this lot; asking Aldersyke.' },
    ];
  }
  if (code === 'CS-6001') {
    return [
      { on: on(88, 1), by: 'ilse', before: 'in-use', after: 'on-hold', reason: 'A customer reports a skin reaction. Sale stopped while we check.' },
      { on: on(89, 4), by: 'ilse', before: 'on-hold', after: 'in-use', reason: 'Kept bars of all batches checked: no excess alkali, allergen is named on the label.' },
    ];
  }
  if (code === 'GR-4188') {
    return [
      { on: on(81, 1), by: 'benedikt', before: 'in-use', after: 'on-hold', reason: 'Smells off in nearly every batch; it was past its date when it was opened.' },
      { on: on(86, 3), by: 'ilse', before: 'on-hold', after: 'returned', reason: 'Aldersyke takes it back against credit.' },
    ];
  }
  return [];
}
