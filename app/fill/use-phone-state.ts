import { useEffect, useState, useSyncExternalStore } from 'react';
import { thisPhone } from './phone';
import { emptyPhone, type PhoneState } from './store';

const subscribe = (changed: () => void) => thisPhone().store.subscribe(changed);

/**
 * A part of what this phone keeps. Nothing on the server and while the page takes over from it.
 * @param select must answer the same value for the same state
 */
export function usePhoneState<Part>(select: (state: PhoneState) => Part): Part {
  return useSyncExternalStore(
    subscribe,
    () => select(thisPhone().store.getState()),
    () => select(emptyPhone),
  );
}

/** True once `now` has been true for `ms` without a break. */
export function useLasting(now: boolean, ms: number): boolean {
  const [lasting, setLasting] = useState(false);
  useEffect(() => {
    if (!now) {
      setLasting(false);
      return;
    }
    const timer = setTimeout(() => setLasting(true), ms);
    return () => clearTimeout(timer);
  }, [now, ms]);
  return lasting;
}
