import type { Advice, FillEvent } from '../../app/air/contract';

/** Whoever tells the crew what to do: the product, or one that sees everything. */
export interface Adviser {
  apply(event: FillEvent): void;
  advise(at: number): Advice;
}

export type { Advice, Call, FillEvent, FillSetup } from '../../app/air/contract';
