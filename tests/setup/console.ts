import { afterEach, beforeEach } from 'vitest';

/** Unexpected console output fails a test; one that expects it replaces the method itself. */
const METHODS = ['log', 'info', 'warn', 'error', 'debug'] as const;
const seen: string[] = [];

beforeEach(() => {
  seen.length = 0;
  for (const method of METHODS) {
    console[method] = (...words: unknown[]) => {
      seen.push(`console.${method}: ${words.map(String).join(' ')}`);
    };
  }
});

afterEach(() => {
  const output = seen.splice(0);
  if (output.length > 0) throw new Error(`Unexpected console output:\n${output.join('\n')}`);
});
