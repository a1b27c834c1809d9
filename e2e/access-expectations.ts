/** Those who ask. A plain helper asks while no round is under way. */
export const roles = [
  'nobody',
  'stranger',
  'viewer',
  'helper',
  'helper during a round',
  'driver',
  'owner',
] as const;
export type Role = (typeof roles)[number];

/** What an answer comes to; `e2e/access.spec.ts` reads it off the status. */
export type Outcome =
  | 'ok'
  /** Goes on to another page: a form that worked, or a page that has no more to show. */
  | 'goes on'
  | 'sign-in'
  | 'unauthorized'
  | 'forbidden'
  | 'hidden'
  | 'wrong method'
  /** Got as far as the form's own check. */
  | 'invalid';

export type Expected = Record<Role, Outcome>;

const row = (
  nobody: Outcome,
  stranger: Outcome,
  viewer: Outcome,
  helper: Outcome,
  inRound: Outcome,
  driver: Outcome,
  owner: Outcome,
): Expected => ({
  nobody,
  stranger,
  viewer,
  helper,
  'helper during a round': inRound,
  driver,
  owner,
});

const all = (outcome: Outcome) =>
  row(outcome, outcome, outcome, outcome, outcome, outcome, outcome);
const signedIn = (outcome: Outcome, nobody: Outcome = 'sign-in'): Expected => ({
  ...all(outcome),
  nobody,
});

// The columns of the table "Who may do what" in the design.
const seeCoach = row('sign-in', 'hidden', 'ok', 'hidden', 'ok', 'ok', 'ok');
const seeLog = row('sign-in', 'hidden', 'ok', 'hidden', 'forbidden', 'ok', 'ok');
const seeFill = row('unauthorized', 'hidden', 'ok', 'hidden', 'ok', 'ok', 'ok');
const tap = row('unauthorized', 'hidden', 'forbidden', 'hidden', 'ok', 'ok', 'ok');
const run = row('unauthorized', 'hidden', 'forbidden', 'hidden', 'forbidden', 'ok', 'ok');

/** The same for a page: nobody is sent to sign-in, and a form that worked goes on. */
const page = (expected: Expected, done: Outcome): Expected =>
  Object.fromEntries(
    roles.map((role) => {
      const outcome = role === 'nobody' ? 'sign-in' : expected[role];
      return [role, outcome === 'ok' ? done : outcome];
    }),
  ) as Expected;
const edit = row('sign-in', 'hidden', 'forbidden', 'hidden', 'forbidden', 'forbidden', 'goes on');

/** What reading each address comes to. */
export const reads: Record<string, Expected> = {
  '/': all('ok'),
  '/practice': all('ok'),
  '/help': all('ok'),
  '/help/rig': all('ok'),
  '/help/safety': all('ok'),
  '/help/glossary': all('ok'),
  '/login': signedIn('goes on', 'ok'),
  '/login/code': all('sign-in'),
  '/logout': signedIn('ok', 'goes on'),
  '/account': signedIn('ok'),
  '/coaches': signedIn('ok'),
  '/coaches/new': signedIn('ok'),
  '/coaches/:coachId': seeCoach,
  '/coaches/:coachId/tires': seeCoach,
  '/coaches/:coachId/targets': seeCoach,
  '/coaches/:coachId/air': seeCoach,
  '/coaches/:coachId/settings': seeCoach,
  '/coaches/:coachId/history': seeLog,
  '/coaches/:coachId/rounds/new': page(run, 'ok'),
  '/rounds/:roundId': seeCoach,
  // A viewer does not tap and is sent to the review.
  '/fills/:fillId': { ...seeCoach, viewer: 'goes on' },
  '/fills/:fillId/review': seeLog,
  '/api/v1/openapi.json': all('ok'),
  '/api/v1/rounds/:roundId': all('wrong method'),
  '/api/v1/rounds/:roundId/cautions': all('wrong method'),
  '/api/v1/rounds/:roundId/readings/:readingId': all('wrong method'),
  '/api/v1/rounds/:roundId/closing': all('wrong method'),
  '/api/v1/runs/:runId': all('wrong method'),
  '/api/v1/runs/:runId/events': seeFill,
  '/healthz': all('ok'),
  '/readyz': all('ok'),
  '/*': all('hidden'),
};

/** What each write comes to: method, address and, where an address takes several, which. */
export const writes: Record<string, Expected> = {
  // Whoever is signed in has nothing to do there, and without having asked no code is taken.
  'POST /login': signedIn('goes on', 'invalid'),
  'POST /login/code': all('sign-in'),
  'POST /logout': all('goes on'),
  'POST /account': signedIn('goes on'),
  'POST /coaches/new': signedIn('goes on'),
  'POST /coaches/:coachId/tires correct': edit,
  'POST /coaches/:coachId/tires replace': edit,
  'POST /coaches/:coachId/tires move': edit,
  'POST /coaches/:coachId/targets': edit,
  'POST /coaches/:coachId/air rig': edit,
  'POST /coaches/:coachId/air lowering': edit,
  'POST /coaches/:coachId/air fitting': edit,
  'POST /coaches/:coachId/settings': edit,
  'POST /coaches/:coachId/settings remove': edit,
  'POST /coaches/:coachId/rounds/new': page(run, 'goes on'),
  'POST /rounds/:roundId cautions': page(run, 'goes on'),
  'POST /rounds/:roundId reading': page(run, 'goes on'),
  'POST /rounds/:roundId fill': page(run, 'goes on'),
  'POST /rounds/:roundId close': page(run, 'goes on'),
  'PUT /api/v1/rounds/:roundId': run,
  'PUT /api/v1/rounds/:roundId/cautions': run,
  'PUT /api/v1/rounds/:roundId/readings/:readingId': run,
  'PUT /api/v1/rounds/:roundId/closing': run,
  'PUT /api/v1/runs/:runId': run,
  'POST /api/v1/runs/:runId/events tap': tap,
  'POST /api/v1/runs/:runId/events end': run,
  'POST /*': all('hidden'),
};
