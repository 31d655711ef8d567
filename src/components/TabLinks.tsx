import { Link } from 'react-router-dom';

/** Views of one screen, each with its own address. */
export function TabLinks({ label, tabs, current }: { label: string; tabs: readonly { key: string; label: string; to: string }[]; current: string }) {
  return (
    <nav aria-label={label} className="inline-flex w-fit max-w-full gap-0.5 overflow-x-auto rounded-bar bg-line-firm p-px">
      {tabs.map(({ key, label: words, to }) => (
        <Link key={key} to={to} aria-current={key === current ? 'page' : undefined} className="flex min-h-10 items-center bg-tray px-3.5 text-row font-[540] whitespace-nowrap no-underline aria-[current=page]:bg-ink aria-[current=page]:text-on-ink coarse:min-h-12">{words}</Link>
      ))}
    </nav>
  );
}
