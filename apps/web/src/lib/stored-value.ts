import { useSyncExternalStore } from 'react';

export interface StoredValue<T> {
  get: () => T;
  set: (next: T) => void;
  subscribe: (listener: () => void) => () => void;
}

interface Keeping<T> {
  key: string;
  /** From the kept text, `null` where nothing is kept; must bear any text, since people can edit it. */
  read: (text: string | null) => T;
  /** To text; `null` keeps nothing. */
  write: (value: T) => string | null;
  storage?: () => Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;
  events?: () => Pick<EventTarget, 'addEventListener' | 'removeEventListener'> | undefined;
}

/**
 * A value kept in the browser and shared by all tabs of the shop. Where storage is refused (a private window,
 * a full disk) it lives as long as the page.
 */
export function storedValue<T>({
  key,
  read,
  write,
  storage = () => localStorage,
  events = () => globalThis.window,
}: Keeping<T>): StoredValue<T> {
  const listeners = new Set<() => void>();
  let text: string | null | undefined;
  let value: T;

  const textKept = () => {
    try {
      return storage().getItem(key);
    } catch {
      return null;
    }
  };
  const take = (next: string | null) => {
    if (next === text) return false;
    text = next;
    value = read(next);
    return true;
  };
  const onStorage = (event: Event) => {
    // A cleared storage names no key.
    const changed = (event as StorageEvent).key;
    if ((changed === key || changed === null) && take(textKept()))
      listeners.forEach((listener) => listener());
  };

  return {
    get: () => {
      if (text === undefined) take(textKept());
      return value;
    },
    set: (next) => {
      const written = write(next);
      try {
        if (written === null) storage().removeItem(key);
        else storage().setItem(key, written);
      } catch {
        // Kept for this page only.
      }
      text = written;
      value = next;
      listeners.forEach((listener) => listener());
    },
    subscribe: (listener) => {
      if (listeners.size === 0) events()?.addEventListener('storage', onStorage);
      listeners.add(listener);
      return () => {
        listeners.delete(listener);
        if (listeners.size === 0) events()?.removeEventListener('storage', onStorage);
      };
    },
  };
}

export const useStoredValue = <T>(stored: StoredValue<T>): T =>
  useSyncExternalStore(stored.subscribe, stored.get);
