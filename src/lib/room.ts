import { useSyncExternalStore } from 'react';

export type Room = 'day' | 'evening';

const KEY = 'loafmark.room';
const listeners = new Set<() => void>();

function chosen(): Room | undefined {
  try {
    const room = localStorage.getItem(KEY);
    return room === 'day' || room === 'evening' ? room : undefined;
  } catch {
    // Storage can be closed off; the room then follows the device.
    return undefined;
  }
}

function deviceRoom(): Room {
  return typeof matchMedia === 'function' && matchMedia('(prefers-color-scheme: dark)').matches ? 'evening' : 'day';
}

/** The room of this device: what was chosen on it, else what the device prefers. */
export function currentRoom(): Room {
  return chosen() ?? deviceRoom();
}

/** Writes the room on the page; called once at the start and after each change. */
export function applyRoom(): void {
  document.documentElement.dataset['room'] = currentRoom();
}

export function setRoom(room: Room): void {
  try {
    localStorage.setItem(KEY, room);
  } catch {
    document.documentElement.dataset['room'] = room;
  }
  applyRoom();
  listeners.forEach((listener) => listener());
}

export function useRoom(): Room {
  return useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => listeners.delete(listener);
  }, currentRoom);
}
