import { Dialog } from '#src/components/Dialog.tsx';
import { BENCH, DESK } from './navigation.ts';

const KEYS: readonly (readonly [string, string])[] = [
  ['/', 'Find a batch or lot'],
  ...[...BENCH, ...DESK].map(({ key, label }) => [`g ${key}`, `Go to ${label}`] as const),
  ['j  k', 'Next row, row before'],
  ['Enter', 'Open the row'],
  ['p  a', 'On a photo: point, area'],
  ['arrows', 'On a photo: move the mark'],
  ['1  2  3', 'On a photo: severity'],
  ['m', 'On a photo: marks on or off'],
  ['z', 'On a photo: closer'],
  ['?', 'This list'],
];

/** The list of keys. */
export function KeyList({ isOpen, onClose }: { isOpen: boolean; onClose: () => void }) {
  return (
    <Dialog title="Keys" isOpen={isOpen} onClose={onClose}>
      <dl className="grid grid-cols-[7rem_1fr] gap-y-1.5">
        {KEYS.map(([key, does]) => (
          <div key={key} className="contents">
            <dt className="stamp text-row">{key}</dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
      <p className="text-note text-ink-2">Single keys can be switched off under Workshop, My settings.</p>
    </Dialog>
  );
}
