import type { Stopping } from './stopping';

export interface Counts {
  readonly passed: number;
  readonly failed: number;
}

/** One call of the test command. */
export interface Run {
  /** This run's own folder. */
  readonly folder: string;
  /** Words for the part's tool: paths of tests and flags. */
  readonly rest: readonly string[];
  readonly stopping: Stopping;
}
