import type { z } from 'zod';

/** What was typed, by field; several values where boxes are ticked. */
export type FormValues = Record<string, string | string[]>;

export interface FormProblem {
  /** Absent when it belongs to the whole form. */
  name?: string;
  message: string;
}

/** A form that comes back: what was typed and what is to be put right. */
export interface FormAnswer {
  values: FormValues;
  problems: FormProblem[];
}

/** The fields of a form; those in `many` are lists, even when one or none is ticked. */
export function formValues(form: FormData, many: readonly string[] = []): FormValues {
  const values: FormValues = {};
  for (const name of many) values[name] = form.getAll(name).map(String);
  for (const [name, value] of form) {
    if (!many.includes(name)) values[name] = typeof value === 'string' ? value : '';
  }
  return values;
}

/** Reads a form with a schema: its data, or the answer that the form comes back with. */
export function readForm<Schema extends z.ZodType>(
  schema: Schema,
  values: FormValues,
): { ok: true; data: z.infer<Schema> } | { ok: false; answer: FormAnswer } {
  const parsed = schema.safeParse(values);
  if (parsed.success) return { ok: true, data: parsed.data };
  const problems = parsed.error.issues.map((issue) => ({
    ...(issue.path.length > 0 ? { name: issue.path.join('.') } : {}),
    message: issue.message,
  }));
  return { ok: false, answer: { values, problems } };
}

/** The first thing that is wrong with a field, to stand beside it. */
export const problemOf = (answer: FormAnswer | undefined, name: string): string | undefined =>
  answer?.problems.find((problem) => problem.name === name)?.message;

/** What a field shows: what was typed, else what is stored. */
export function shownValue(
  answer: FormAnswer | undefined,
  name: string,
  stored?: string,
): string | undefined {
  const typed = answer?.values[name];
  return typeof typed === 'string' ? typed : stored;
}
