import type { Role } from '#shared/words/roles.ts';

export const ROLE_WORDS: Record<Role, string> = { owner: 'owner', maker: 'maker', inspector: 'inspector', viewer: 'reads only' };

/** What each role does, where somebody has to choose one. */
export const ROLE_SAYS: Record<Role, string> = {
  owner: 'Everything, with people, settings, claims and the trail',
  maker: 'Logs batches, lots and formulas, and inspects',
  inspector: 'Inspects, takes photos, puts lots on hold; sees no formula quantities',
  viewer: 'Reads batches, photos and causes; writes nothing',
};

export const ROLE_OPTIONS = (['owner', 'maker', 'inspector', 'viewer'] as const).map((value) => ({ value, label: `${ROLE_WORDS[value]}: ${ROLE_SAYS[value].toLowerCase()}` }));
