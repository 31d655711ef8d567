import type { CauseDetail } from '#shared/causes.ts';
import { Rail } from '#src/components/Rail.tsx';
import { formatCount, formatDay } from '#src/lib/format.ts';
import { LEFT_OUT_WORDS } from './cause-words.ts';
import { ratio } from './OddsRows.tsx';

/** What to know before acting on a cause: what moved with it, what melts away, what is on the path, what would shake or prove it. */
export function BeforeYouAct({ cause }: { cause: CauseDetail }) {
  const lines = linesOf(cause);
  return (
    <section>
      <Rail heading="Before you act on it" />
      <dl className="m-0">
        {lines.map(([head, words]) => (
          <div key={head} className="grid grid-cols-[8.5rem_minmax(0,1fr)] gap-x-3 border-b border-line px-1.5 py-2.5 text-row max-rack:grid-cols-1">
            <dt className="font-[640]">{head}</dt><dd className="m-0">{words}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

function linesOf({ cell, adjustedFor, meltedAway, onThePath, tiedWith, leaveOneOut, differs, leftOut, fault, generatedFrom }: CauseDetail): [string, string][] {
  const lines: [string, string][] = [];
  const name = fault.name.toLowerCase();
  if (tiedWith.length > 0) lines.push(['Tied with', `${tiedWith.map(({ label }) => label).join(' and ')}. Nothing in these records tells them apart.`]);
  if (adjustedFor.length > 0) lines.push(['Moved with it', `${adjustedFor.map(({ label }) => label).join(', ')}. Held still here.`]);
  if (cell.meltsAway) lines.push(['Melts away', `By the raw count it goes with ${name}; with what moved with it held still, little is left of that.`]);
  if (meltedAway.length > 0) lines.push(['Looked like it', meltedAway.slice(0, 4).map((one) => `${one.label} (${one.exposedEvents} of ${one.exposedN} against ${one.unexposedEvents} of ${one.unexposedN})`).join('; ') + '. With what moved with them held still, little is left.']);
  if (onThePath.length > 0) lines.push(['Not taken out', `${onThePath.map((one) => one.name).join(', ')}. It lies on the path to ${name}.`]);
  if (differs) lines.push(['Not everywhere', 'Methods and makers differ from each other more than chance would make them; read the table by method and maker.']);
  if (leaveOneOut) lines.push(['Would shake it', `Any one batch left out gives odds between ×${ratio(leaveOneOut.lowest)} and ×${ratio(leaveOneOut.highest)}.`]);
  if (['settled', 'likely', 'hint'].includes(cell.grade)) lines.push(['Would prove it', 'A trial pour: one batter split in two, only this changed, the order drawn.']);
  if (cell.moreNeeded !== null) lines.push(['Would settle it', `About ${formatCount(cell.moreNeeded, 'more batch', 'more batches')}.`]);
  const out = leftOut.map(({ reason, count }) => `${count} ${LEFT_OUT_WORDS[reason] ?? reason}`);
  lines.push(['Left out', [`${cell.notChecked} where ${name} was not looked at or cannot be seen yet`, ...out].join(', ') + '.']);
  if (generatedFrom.firstMadeOn && generatedFrom.lastMadeOn) lines.push(['Counted', `${formatCount(generatedFrom.batches, 'batch', 'batches')} made ${formatDay(generatedFrom.firstMadeOn)} to ${formatDay(generatedFrom.lastMadeOn)}.`]);
  return lines;
}
