/** One thing that was wrong in what was sent. */
export interface FieldProblem {
  /** Place in a batch, where there is one. */
  index?: number;
  field: string;
  value: unknown;
  /** What would have been accepted, in words. */
  expected: string;
}

/** The status that each kind of refusal is answered with. */
const statusOf = {
  'bad-input': 400,
  'not-signed-in': 401,
  'not-allowed': 403,
  'not-found': 404,
  'wrong-method': 405,
  conflict: 409,
  'too-large': 413,
  'wrong-type': 415,
  'too-many': 429,
  unavailable: 503,
} as const;

/**
 * An expected refusal: a stable code and words for the person who asked.
 * Anything else that is thrown is a fault and is never shown.
 */
export class Refusal extends Error {
  readonly status: number;

  constructor(
    readonly kind: keyof typeof statusOf,
    /** Stable, for programs: `round-not-found`, `fill-open`. */
    readonly code: string,
    /** For people: one or two short sentences. */
    readonly words: string,
    readonly problems: readonly FieldProblem[] = [],
  ) {
    super(`${code}: ${words}`);
    this.name = 'Refusal';
    this.status = statusOf[kind];
  }

  /** The body of an answer after RFC 9457, problem details. */
  toProblem() {
    return {
      type: `/help/problems#${this.code}`,
      title: this.code.replaceAll('-', ' '),
      status: this.status,
      detail: this.words,
      code: this.code,
      errors: this.problems,
    };
  }
}

/** A coach, round or fill that is not there, or not for this person: the two look the same. */
export const notFound = (what: string) =>
  new Refusal('not-found', `${what}-not-found`, `There is no such ${what}, or it is not yours.`);
