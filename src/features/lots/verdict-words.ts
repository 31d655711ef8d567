import type { LotVerdict } from '#shared/lot-behaviour.ts';

export const VERDICT_WORDS: Record<LotVerdict, string> = { misbehaves: 'misbehaves', watch: 'watch it', disagrees: 'counts and board disagree', 'too-few': 'too few to tell', 'as-its-peers': 'as its peers' };
export const VERDICT_SETTING: Record<LotVerdict, string> = { misbehaves: 'set-settled', watch: 'set-likely', disagrees: 'set-hint', 'too-few': 'set-few', 'as-its-peers': 'set-likely' };
