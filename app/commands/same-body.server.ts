import { type FieldProblem, Refusal } from '~/services/refusal.server';

/** One text for one meaning: the order of an object's keys says nothing. */
function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, inside: unknown) =>
    inside && typeof inside === 'object' && !Array.isArray(inside)
      ? Object.fromEntries(Object.entries(inside).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inside,
  );
}

/** Fields of `sent` that differ from what is stored under the same id. */
export function differences(
  stored: Readonly<Record<string, unknown>>,
  sent: Readonly<Record<string, unknown>>,
): FieldProblem[] {
  const fields = new Set([...Object.keys(stored), ...Object.keys(sent)]);
  return [...fields]
    .filter((field) => canonical(stored[field]) !== canonical(sent[field]))
    .map((field) => ({
      field,
      value: sent[field],
      expected: 'what was sent first under this id',
    }));
}

/**
 * Passes a command that is sent again, and refuses one that gives its id another meaning.
 * @throws Refusal `other-body`
 */
export function refuseOtherBody(
  what: string,
  stored: Readonly<Record<string, unknown>>,
  sent: Readonly<Record<string, unknown>>,
): void {
  const problems = differences(stored, sent);
  if (problems.length === 0) return;
  throw new Refusal(
    'conflict',
    'other-body',
    `This id already stands for another ${what}.`,
    problems,
  );
}
