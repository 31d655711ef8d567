import { createContext, use, useCallback, useMemo, useRef, useState, type ReactNode } from 'react';
import { Block } from './Block.tsx';

interface Toast {
  key: number;
  says: string;
  undo?: (() => void) | undefined;
}

interface ToastApi {
  /** Says what was done; with `undo` it can be taken back for ten seconds. */
  tell(says: string, undo?: () => void): void;
}

const TOAST_MS = 10_000;
const ToastContext = createContext<ToastApi>({ tell: () => undefined });

export function useToasts(): ToastApi {
  return use(ToastContext);
}

/** Short words at the foot of the page, kept long enough for wet hands. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [toasts, setToasts] = useState<Toast[]>([]);
  const nextKey = useRef(0);
  const drop = useCallback((key: number) => setToasts((current) => current.filter((toast) => toast.key !== key)), []);
  const api = useMemo<ToastApi>(() => ({
    tell(says, undo) {
      const key = (nextKey.current += 1);
      setToasts((current) => [...current.slice(-2), { key, says, undo }]);
      setTimeout(() => drop(key), TOAST_MS);
    },
  }), [drop]);
  return (
    <ToastContext value={api}>
      {children}
      <div role="status" aria-live="polite" className="no-print fixed inset-x-0 bottom-18 z-30 mx-auto grid w-fit max-w-[calc(100vw-2rem)] gap-2 rack:bottom-4">
        {toasts.map(({ key, says, undo }) => (
          <div key={key} className="flex min-h-12 items-center gap-4 rounded-bar bg-ink py-1 pl-4 pr-1 text-on-ink">
            <span>{says}</span>
            {undo ? (
              <Block kind="plain" className="text-ink" onClick={() => { undo(); drop(key); }}>Undo</Block>
            ) : (
              <button type="button" aria-label="Close this message" className="min-h-11 min-w-11" onClick={() => drop(key)}>×</button>
            )}
          </div>
        ))}
      </div>
    </ToastContext>
  );
}
