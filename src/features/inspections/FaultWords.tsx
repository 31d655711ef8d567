import type { FaultView } from '#shared/faults.ts';
import { SeverityNotches } from '#src/components/SeverityNotches.tsx';

/** What a fault looks like, how bad is how bad, and what it could be mistaken for. */
export function FaultWords({ fault }: { fault: FaultView }) {
  return (
    <div className="grid gap-2 bg-tray px-3 py-3 text-row leading-snug">
      <p>{fault.definition}</p>
      {fault.otherNames.length > 0 && <p className="text-note text-ink-2">Also called {fault.otherNames.join(', ')}.</p>}
      <ul className="grid gap-1">
        {fault.criteria.map((criterion, index) => criterion !== null && (
          <li key={index} className="grid grid-cols-[2rem_1fr] items-baseline"><SeverityNotches severity={index + 1} />{criterion}</li>
        ))}
      </ul>
      {fault.lookAlikes.length > 0 && (
        <p><b className="font-[640]">Could it be something else?</b> {fault.lookAlikes.map(({ name, howToTell }) => `${name}: ${howToTell}`).join(' ')}</p>
      )}
    </div>
  );
}
