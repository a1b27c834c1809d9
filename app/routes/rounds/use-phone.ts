import { useSyncExternalStore } from 'react';
import { thisPhone } from '~/fill/phone';
import { emptyPhone, type PhoneState } from '~/fill/store';

const subscribe = (changed: () => void) => thisPhone().store.subscribe(changed);
const read = () => thisPhone().store.getState();
const readNothing = () => emptyPhone;

/** What this phone keeps. Empty on the server and while the page takes over from it. */
export const usePhone = (): PhoneState => useSyncExternalStore(subscribe, read, readNothing);
