import { newId } from './ids';

/** This browser, as the log knows it. */
export interface Device {
  readonly id: string;
  /** Counts up with every event, over reloads too. */
  readonly nextSeq: () => number;
}

type Kept = Pick<Storage, 'getItem' | 'setItem'>;

const idKey = 'valveside.device';
const seqKey = 'valveside.device-seq';

/** The device that `kept` remembers; one that lives as long as the page where nothing is kept. */
export function openDevice(kept: Kept | undefined): Device {
  let seq = Number(read(kept, seqKey) ?? 0) || 0;
  const id = read(kept, idKey) ?? newId();
  write(kept, idKey, id);
  return {
    id,
    nextSeq: () => {
      seq += 1;
      write(kept, seqKey, String(seq));
      return seq;
    },
  };
}

// Reading or writing throws when the person has forbidden a site to keep anything.
function read(kept: Kept | undefined, key: string): string | null {
  try {
    return kept?.getItem(key) ?? null;
  } catch {
    return null;
  }
}

function write(kept: Kept | undefined, key: string, value: string): void {
  try {
    kept?.setItem(key, value);
  } catch {
    // Without it the device is a new one after a reload, which costs nothing but a name.
  }
}
