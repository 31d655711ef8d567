import { People20261201100000 } from './20261201-100000-people.ts';
import { Audit20261201100100 } from './20261201-100100-audit.ts';
import { Stock20261201100200 } from './20261201-100200-stock.ts';
import { Batches20261201100300 } from './20261201-100300-batches.ts';
import { Imports20261201110000 } from './20261201-110000-imports.ts';
import { Log20261201110100 } from './20261201-110100-log.ts';
import { Looks20261201120000 } from './20261201-120000-looks.ts';
import { Claims20261201130000 } from './20261201-130000-claims.ts';
import { Doors20261201150000 } from './20261201-150000-doors.ts';

/** Every migration in order; a new one is added at the end and never edited once merged. */
export const MIGRATIONS = [
  People20261201100000, Audit20261201100100, Stock20261201100200, Batches20261201100300, Imports20261201110000, Log20261201110100,
  Looks20261201120000, Claims20261201130000, Doors20261201150000,
];
