import { expect, test } from 'vitest';
import { endAll } from './shutdown.server';

test('steps end in the given order, one after the other', async () => {
  const ended: string[] = [];
  const step = (name: string, milliseconds: number) => ({
    name,
    end: () =>
      new Promise<void>((resolve) => {
        setTimeout(() => {
          ended.push(name);
          resolve();
        }, milliseconds);
      }),
  });
  await endAll([step('streams', 20), step('database', 0)]);
  expect(ended).toEqual(['streams', 'database']);
});

test('a step that throws, rejects or never ends keeps no other from ending', async () => {
  const ended: string[] = [];
  await endAll(
    [
      {
        name: 'throws',
        end: () => {
          throw new Error('no');
        },
      },
      { name: 'rejects', end: () => Promise.reject(new Error('no')) },
      { name: 'hangs', end: () => new Promise<void>(() => {}) },
      { name: 'last', end: () => void ended.push('last') },
    ],
    10,
  );
  expect(ended).toEqual(['last']);
});
