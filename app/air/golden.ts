/**
 * A committed log and the advice that this engine gives along it, as one text: the same bytes in
 * Node, in Chromium and on every phone. Its hash stands in `golden.test.ts`.
 */
import type { FillEvent, FillSetup } from './contract';
import golden from './golden-log.json';
import { createFill } from './index';

/** The advice along the golden log, one JSON line each time. */
export function goldenAdvice(): string {
  const fill = createFill(golden.setup as FillSetup);
  for (const event of golden.events) fill.apply(event as FillEvent);
  const lines: string[] = [];
  for (let at = 0; at <= golden.until; at += golden.askedEvery) {
    lines.push(JSON.stringify(fill.advise(at)));
  }
  lines.push(JSON.stringify(fill.profile()));
  return `${lines.join('\n')}\n`;
}
