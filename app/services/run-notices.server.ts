import { EventEmitter } from 'node:events';

/** Something was added to a fill's log; said after the commit. */
export interface LogNotice {
  runId: string;
  lastSeq: number;
  ended: boolean;
}

const kept = globalThis as typeof globalThis & { valvesideRunNotices?: EventEmitter };

/** Kept across reloads of the dev server, so that nobody listens to a former one. */
kept.valvesideRunNotices ??= new EventEmitter();
const notices = kept.valvesideRunNotices;

export function publishLog(notice: LogNotice): void {
  notices.emit('log', notice);
}

/** Returns how to stop listening. */
export function onLog(listen: (notice: LogNotice) => void): () => void {
  notices.on('log', listen);
  return () => void notices.off('log', listen);
}
