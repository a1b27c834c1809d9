import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

/** What gives the same bits in every JavaScript engine (design/engine.md). */
const ALLOWED = ['sqrt', 'abs', 'min', 'max', 'floor', 'trunc', 'round', 'imul', 'fround'];

function sources(): { name: string; text: string }[] {
  return readdirSync(import.meta.dirname)
    .filter((name) => name.endsWith('.ts') && !name.endsWith('.test.ts'))
    .map((name) => ({ name, text: readFileSync(join(import.meta.dirname, name), 'utf8') }));
}

function withoutComments(text: string): string {
  return text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/\/\/.*$/gm, '');
}

describe.each(sources())('app/air/$name', ({ text }) => {
  const code = withoutComments(text);

  it('uses only arithmetic that gives the same bits everywhere', () => {
    const used = [...code.matchAll(/\bMath\.(\w+)/g)].map((match) => match[1]);
    expect(used.filter((name) => !ALLOWED.includes(name!))).toEqual([]);
    expect(code).not.toMatch(/\*\*/);
    expect(code).not.toMatch(/\bMath\b(?!\.)/);
  });

  it('knows no clock, no chance of its own and no environment', () => {
    expect(code).not.toMatch(/\bDate\b|\bperformance\b|\bprocess\b|Math\.random|toLocale|Intl\b/);
  });

  it('imports nothing from outside app/air and app/units', () => {
    const from = [...code.matchAll(/from '([^']+)'/g)].map((match) => match[1]!);
    expect(from.filter((path) => !/^\.\/|^\.\.\/units\//.test(path))).toEqual([]);
  });

  it('has at most 300 lines', () => {
    expect(text.split('\n').length).toBeLessThanOrEqual(301);
  });
});
