import { useSyncExternalStore } from 'react';

const NARROW = '(max-width: 62.4375rem)';

function listen(changed: () => void): () => void {
  const query = window.matchMedia(NARROW);
  query.addEventListener('change', changed);
  return () => query.removeEventListener('change', changed);
}

/** Whether the screen is narrower than a desk, for what would be too heavy to draw twice. */
export function useNarrow(): boolean {
  return useSyncExternalStore(listen, () => window.matchMedia(NARROW).matches);
}
