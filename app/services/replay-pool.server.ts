import { existsSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import type { FillSetup } from '~/air';
import type { RunLog } from '~/fill/log';
import type { Replayed } from '~/fill/replay';
import { onShutdown } from './shutdown.server';

/** What a worker is sent. */
export interface ReplayOrder {
  readonly setup: FillSetup;
  readonly log: RunLog;
}

export type ReplayAnswer = { readonly replayed: Replayed } | { readonly fault: string };

/** The pool was told to stop, or its worker was lost, before there was an answer. */
export class ReplayEnded extends Error {
  override readonly name = 'ReplayEnded';
}

interface Job {
  readonly order: ReplayOrder;
  readonly resolve: (replayed: Replayed) => void;
  readonly reject: (fault: Error) => void;
}

/** One core stays free for those who wait for pages. */
const size = Math.max(1, Math.min(2, availableParallelism() - 1));

/** A replay takes a second or two; a worker that is busy for longer is lost. */
const patienceMs = 60_000;

const waiting: Job[] = [];
const idle: Worker[] = [];
const all = new Set<Worker>();

/** Replays a fill's log by the engine in a thread of its own; the order asked is the order begun. */
export function replay(order: ReplayOrder): Promise<Replayed> {
  return new Promise((resolve, reject) => {
    waiting.push({ order, resolve, reject });
    startNext();
  });
}

/** Ends the threads. What was asked and not yet answered is refused. */
export async function stopReplayPool(): Promise<void> {
  for (const { reject } of waiting.splice(0)) reject(new ReplayEnded('the replay pool has ended'));
  idle.length = 0;
  await Promise.all([...all].map((worker) => worker.terminate()));
}

function startNext(): void {
  if (waiting.length === 0) return;
  const worker = idle.pop() ?? (all.size < size ? startWorker() : undefined);
  const job = worker && waiting.shift();
  if (worker && job) work(worker, job);
}

function startWorker(): Worker {
  onShutdown('replay pool', stopReplayPool);
  const worker = newWorker();
  all.add(worker);
  // Without this listener an error of an idle worker would end the server.
  worker.on('error', () => {});
  worker.once('exit', () => {
    all.delete(worker);
    const place = idle.indexOf(worker);
    if (place >= 0) idle.splice(place, 1);
    startNext();
  });
  return worker;
}

function work(worker: Worker, { order, resolve, reject }: Job): void {
  const timer = setTimeout(() => void worker.terminate(), patienceMs);
  const lost = (cause?: unknown) => {
    clearTimeout(timer);
    reject(cause instanceof Error ? cause : new ReplayEnded('the worker ended before its answer'));
  };
  worker.ref();
  worker.once('exit', lost);
  worker.once('error', lost);
  worker.once('message', (answer: ReplayAnswer) => {
    clearTimeout(timer);
    worker.off('exit', lost);
    worker.off('error', lost);
    worker.unref();
    idle.push(worker);
    if ('fault' in answer) reject(new Error(answer.fault));
    else resolve(answer.replayed);
    startNext();
  });
  worker.postMessage(order);
}

/**
 * In a build the worker is a file beside the server's (`react-router.config.ts` makes it); in
 * development and in tests it is the source, read through tsx. The flags of this process are not
 * handed on: they are meant for the server alone.
 */
function newWorker(): Worker {
  const built = ['./replay-worker.js', '../replay-worker.js']
    .map((path) => fileURLToPath(new URL(path, import.meta.url)))
    .find((path) => existsSync(path));
  if (built) return new Worker(built, { execArgv: [] });
  const source = new URL('replay-worker.server.ts', import.meta.url);
  const program = `import('tsx/esm/api').then((tsx) => { tsx.register(); return import('${source}'); });`;
  return new Worker(program, { eval: true, execArgv: [] });
}
