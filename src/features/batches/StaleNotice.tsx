import type { BatchView } from '#shared/batches.ts';
import { Soft } from '#src/components/Caution.tsx';
import type { UnitChoice } from '#src/lib/units.ts';
import type { BatchDraft, Meeting } from './batch-draft.ts';
import { fieldLabel, fieldWords } from './field-words.ts';

/** Somebody else saved first: what came in from them, and both versions of what both changed. Nothing typed is lost. */
export function StaleNotice({ meeting, mine, current, units, onTakeTheirs }: { meeting: Meeting; mine: BatchDraft; current: BatchView; units: UnitChoice; onTakeTheirs: (field: Meeting['both'][number]) => void }) {
  const taken = Object.keys(meeting.theirs);
  return (
    <Soft>
      <p className="font-[640]">Somebody else changed {current.code} meanwhile. What you typed is still here.</p>
      {taken.length > 0 && <p className="text-note">Taken over from them: {taken.map((field) => fieldLabel(field).toLowerCase()).join(', ')}.</p>}
      {meeting.both.length > 0 && (
        <table className="mt-2 w-full text-note">
          <thead><tr className="text-left"><th scope="col" className="pr-4">Both changed</th><th scope="col" className="pr-4">Theirs, kept now</th><th scope="col" className="pr-4">Yours, in the form</th><th /></tr></thead>
          <tbody>
            {meeting.both.map((field) => (
              <tr key={field} className="border-t border-line align-baseline">
                <th scope="row" className="pr-4 text-left font-[560]">{fieldLabel(field)}</th>
                <td className="pr-4">{fieldWords(field, current[field], units)}</td>
                <td className="pr-4">{fieldWords(field, mine[field], units)}</td>
                <td><button type="button" className="min-h-8 underline underline-offset-3 coarse:min-h-12" onClick={() => onTakeTheirs(field)}>Take theirs</button></td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <p className="text-note">Saving again keeps what stands in the form.</p>
    </Soft>
  );
}
