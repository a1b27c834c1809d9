import { data } from 'react-router';
import { Refusal } from '~/services/refusal.server';
import type { FormAnswer, FormProblem, FormValues } from './read-form';

/** Sends a form back with what was typed. */
export const sendBack = (answer: FormAnswer) => data(answer, { status: 400 });

/** What the person can do something about on the same page. */
const comesBack = new Set<Refusal['kind']>(['bad-input', 'conflict']);

/**
 * Runs a command for a form. Bad input comes back beside its fields, a conflict above the form;
 * every other refusal is thrown on to the page's boundary.
 */
export async function runForForm<Result>(
  values: FormValues,
  command: () => Promise<Result>,
): Promise<{ ok: true; result: Result } | { ok: false; answer: FormAnswer }> {
  try {
    return { ok: true, result: await command() };
  } catch (thrown) {
    if (!(thrown instanceof Refusal) || !comesBack.has(thrown.kind)) throw thrown;
    return { ok: false, answer: { values, problems: problemsOf(thrown) } };
  }
}

/** The fields of a conflict are a program's, so its words stand alone. */
function problemsOf({ kind, problems, words }: Refusal): FormProblem[] {
  if (kind === 'conflict' || problems.length === 0) return [{ message: words }];
  return problems.map(({ field, expected }) => ({ name: field, message: expected }));
}
