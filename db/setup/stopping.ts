import { endTools } from './run';

interface Step {
  readonly name: string;
  readonly stop: () => Promise<void>;
}

/**
 * Stops what a command started, once and in the opposite order, whatever asks for it: Ctrl-C (which
 * reaches us several times, from the terminal and through npm), SIGTERM, a closed terminal, or the
 * end of the process above us.
 */
export class Stopping {
  readonly #steps: Step[] = [];
  #stopped: Promise<void> | undefined;

  constructor() {
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
      process.on(signal, () => this.exit(0, 'Stopping …'));
    }
    process.on('disconnect', () => this.exit(0));
  }

  /** Registered before the thing starts, so that a stop in the middle of that finds it too. */
  add(name: string, stop: () => Promise<void>): void {
    this.#steps.push({ name, stop });
  }

  get isStopping(): boolean {
    return this.#stopped !== undefined;
  }

  /** Ends the process after everything has stopped. Only the first call decides the code. */
  async exit(code: number, words?: string): Promise<void> {
    if (this.#stopped) return this.#stopped;
    if (words) console.log(words);
    this.#stopped = this.#stopAll();
    await this.#stopped;
    process.exit(code);
  }

  async #stopAll(): Promise<void> {
    endTools();
    for (const { name, stop } of this.#steps.toReversed()) {
      try {
        await stop();
      } catch (error) {
        console.error(`${name} did not stop cleanly: ${error}`);
      }
    }
  }
}
