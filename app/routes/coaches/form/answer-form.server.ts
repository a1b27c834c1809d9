import { data } from 'react-router';
import { Refusal } from '~/services/refusal.server';
import type { FormAnswer, FormValues } from './read-form';

/** Sends a form back with what was typed. */
export const sendBack = (answer: FormAnswer) => data(answer, { status: 400 });

/**
 * Runs a command for a form. Bad input comes back beside its fields; every other refusal is thrown
 * on to the page's boundary.
 */
export async function runForForm<Result>(
  values: FormValues,
  command: () => Promise<Result>,
): Promise<{ ok: true; result: Result } | { ok: false; answer: FormAnswer }> {
  try {
    return { ok: true, result: await command() };
  } catch (thrown) {
    if (!(thrown instanceof Refusal) || thrown.kind !== 'bad-input') throw thrown;
    const named = thrown.problems.map(({ field, expected }) => ({
      name: field,
      message: expected,
    }));
    const problems = named.length > 0 ? named : [{ message: thrown.words }];
    return { ok: false, answer: { values, problems } };
  }
}
