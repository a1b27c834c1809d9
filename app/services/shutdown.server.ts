import { sequelize } from '~/models/database.server';

/**
 * `react-router-serve` closes its listening socket on SIGTERM and then waits for ever while a stream
 * is open. So the app, which runs in that process, ends what it holds open and then the process.
 */
interface Step {
  readonly name: string;
  readonly end: () => Promise<void> | void;
}

/** No step may hold up the others for longer. */
const STEP_MS = 2000;

/** Time for the last answers to leave after the last step. */
const FLUSH_MS = 100;

const kept = globalThis as typeof globalThis & { valvesideShutdown?: Map<string, Step> };

/**
 * Registers what to end when the server is told to stop. The newest ends first; the database's
 * pool, which lets running queries finish, ends after all of them.
 * @param name what it is; registering the same name again, as a reload does, replaces the former
 */
export function onShutdown(name: string, end: () => Promise<void> | void): void {
  steps().set(name, { name, end });
}

function steps(): Map<string, Step> {
  if (!kept.valvesideShutdown) {
    kept.valvesideShutdown = new Map();
    for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, shutDown);
    onShutdown('database', () => sequelize.close());
  }
  return kept.valvesideShutdown;
}

/** Called by the entry so that a server which registered nothing else still ends its pool. */
export function armShutdown(): void {
  steps();
}

let isEnding = false;

async function shutDown(): Promise<void> {
  if (isEnding) return;
  isEnding = true;
  await endAll([...steps().values()].reverse());
  setTimeout(() => process.exit(0), FLUSH_MS);
}

/** Ends every step in turn; one that fails or takes too long does not keep the others from it. */
export async function endAll(list: readonly Step[], limitMs = STEP_MS): Promise<void> {
  for (const { end } of list) {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const late = new Promise<void>((resolve) => {
      timer = setTimeout(resolve, limitMs);
    });
    await Promise.race([
      Promise.resolve()
        .then(end)
        .catch(() => {}),
      late,
    ]);
    clearTimeout(timer);
  }
}
