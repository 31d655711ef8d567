import { useEffect } from 'react';

/** Shortcuts by key, or by a sequence such as `g t`. */
export type KeyMap = Record<string, () => void>;

const SEQUENCE_MS = 900;
let isOn = true;

/** Single keys can be switched off by the person (WCAG 2.1.4). */
export function setSingleKeys(on: boolean): void {
  isOn = on;
}

function isTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && (target.isContentEditable || /^(?:INPUT|TEXTAREA|SELECT)$/.test(target.tagName));
}

/** Listens for single keys while the component is on the page; never while somebody types. */
export function useKeys(map: KeyMap): void {
  useEffect(() => {
    let before = '';
    let at = 0;
    const listen = (event: KeyboardEvent) => {
      if (!isOn || event.defaultPrevented || event.metaKey || event.ctrlKey || event.altKey || isTyping(event.target)) return;
      const sequence = event.timeStamp - at < SEQUENCE_MS && before ? `${before} ${event.key}` : '';
      const act = (sequence && map[sequence]) || map[event.key];
      before = event.key;
      at = event.timeStamp;
      if (!act) return;
      event.preventDefault();
      before = '';
      act();
    };
    window.addEventListener('keydown', listen);
    return () => window.removeEventListener('keydown', listen);
  }, [map]);
}
