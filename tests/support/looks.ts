import { v7 as uuidv7 } from 'uuid';

/** The wish for a look at the cut on the day after the usual test batch was made. */
export const aLook = (over: object = {}) => ({ id: uuidv7(), stage: 'cut', inspectedAt: '2026-03-03T10:00:00Z', barsLookedAt: 10, ...over });
export const aFinding = (over: object = {}) => ({ id: uuidv7(), fault: 'soda-ash', severity: 2, ...over });
