import type { BatchState, CookStage, Cover, DispositionKind, Gel, Trace } from '#shared/words/batch-words.ts';
import type { Answer } from '#shared/words/fault-words.ts';
import type { Method, MethodFamily } from '#shared/words/methods.ts';
import type { Stage } from '#shared/words/stages.ts';

/** The closed lists as people say them; codes stay on the wire. */
export const METHOD_WORDS: Record<Method, string> = { cold: 'cold', 'cold-oven': 'cold, oven-gelled', hot: 'hot', 'hot-fluid': 'hot, fluid', rebatch: 'rebatch' };
export const FAMILY_WORDS: Record<MethodFamily, string> = { cold: 'cold family', hot: 'hot family', rebatch: 'rebatch' };
export const STATE_WORDS: Record<BatchState, string> = { planned: 'planned', making: 'making', 'in-mould': 'in the mould', curing: 'curing', cured: 'cured', closed: 'closed', abandoned: 'abandoned' };
export const STAGE_WORDS: Record<Stage, string> = {
  pour: 'Pour', unmould: 'Unmould', cut: 'Cut', 'cure-w1': 'Week 1', 'cure-w2': 'Week 2', 'cure-w4': 'Week 4', 'cure-w6': 'Week 6', release: 'Release', 'in-use': 'In use',
};
export const ANSWER_WORDS: Record<Answer, string> = { found: 'found', clear: 'clear', 'not-checked': 'not looked at' };
export const DISPOSITION_WORDS: Record<DispositionKind, string> = { firsts: 'firsts', seconds: 'seconds', rebatch: 'rebatch', embeds: 'embeds', discarded: 'discarded', kept: 'kept' };
export const TRACE_WORDS: Record<Trace, string> = { emulsion: 'emulsion', light: 'light: a trail sinks at once', medium: 'medium: a trail stays', thick: 'thick: holds a peak', seized: 'seized' };
export const GEL_WORDS: Record<Gel, string> = { none: 'none', partial: 'partial', full: 'full', 'not-seen': 'not seen' };
export const COVER_WORDS: Record<Cover, string> = { open: 'open', board: 'board', 'board-and-towel': 'board and towel', oven: 'oven', fridge: 'fridge', 'heat-mat': 'heat mat' };
export const COOK_STAGE_WORDS: Record<CookStage, string> = { trace: 'trace', separating: 'separating', 'apple-sauce': 'apple sauce', 'mashed-potato': 'mashed potato', translucent: 'translucent', taffy: 'taffy' };

/** Options of a select from a list of codes and their words. */
export function optionsOf<Code extends string>(codes: readonly Code[], words: Record<Code, string>): { value: Code; label: string }[] {
  return codes.map((value) => ({ value, label: words[value] }));
}
