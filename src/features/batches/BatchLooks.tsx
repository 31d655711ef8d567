import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Rail } from '#src/components/Rail.tsx';
import { inspectionsOfBatchQuery } from '#src/features/inspections/inspections.queries.ts';
import { useSession } from '#src/features/session/session.queries.ts';
import { formatInstant } from '#src/lib/format.ts';
import { STAGE_WORDS } from '#src/lib/words.ts';

/** The inspections of a batch in order, with what each answered. */
export function BatchLooks({ batchId, toLook }: { batchId: string; toLook: (stage: string) => string }) {
  const { workshop } = useSession();
  const looks = useQuery(inspectionsOfBatchQuery(batchId)).data ?? [];
  if (looks.length === 0) return null;
  return (
    <section className="grid gap-2">
      <Rail heading="Inspections" aside={looks.length} />
      <ol className="text-row">
        {looks.map((look) => {
          const count = (answer: string) => look.answers.filter((one) => one.answer === answer).length;
          return (
            <li key={look.id} className="grid gap-0.5 border-t border-line py-2 first:border-t-0">
              <span className="flex items-baseline justify-between gap-3">
                <Link to={toLook(look.stage)} className="font-[600] underline underline-offset-3 coarse:py-2.5">{STAGE_WORDS[look.stage]}</Link>
                <span className="text-note text-ink-2">{formatInstant(look.inspectedAt, workshop.timeZone)}</span>
              </span>
              <span className="text-ink-2">{count('found')} found, {count('clear')} clear, {count('not-checked')} not looked at{look.inspectorName && `. ${look.inspectorName}`}</span>
              {look.note && <span className="text-ink-2">{look.note}</span>}
            </li>
          );
        })}
      </ol>
    </section>
  );
}
