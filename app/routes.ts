import { index, prefix, type RouteConfig, route } from '@react-router/dev/routes';

/** Every address of the product. `e2e/access.spec.ts` walks this table. */
export default [
  index('routes/landing/landing.tsx'),
  route('practice', 'routes/practice/practice.tsx'),
  route('help', 'routes/help/help.tsx'),
  route('help/rig', 'routes/help/rig.tsx'),
  route('help/safety', 'routes/help/safety.tsx'),
  route('help/glossary', 'routes/help/glossary.tsx'),

  route('login', 'routes/login/login.tsx'),
  route('login/code', 'routes/login/code.tsx'),
  route('logout', 'routes/login/logout.tsx'),
  route('account', 'routes/account/account.tsx'),

  route('coaches', 'routes/coaches/coaches.tsx'),
  route('coaches/new', 'routes/coaches/new-coach.tsx'),
  route('coaches/:coachId', 'routes/coaches/coach.tsx', [
    index('routes/coaches/coach-overview.tsx'),
    route('tires', 'routes/coaches/coach-tires.tsx'),
    route('targets', 'routes/coaches/coach-targets.tsx'),
    route('air', 'routes/coaches/coach-air.tsx'),
    route('settings', 'routes/coaches/coach-settings.tsx'),
    route('history', 'routes/coaches/coach-history.tsx'),
    route('rounds/new', 'routes/rounds/new-round.tsx'),
  ]),
  route('rounds/:roundId', 'routes/rounds/round.tsx'),
  route('fills/:fillId', 'routes/fills/fill.tsx'),
  route('fills/:fillId/review', 'routes/fills/review.tsx'),

  ...prefix('api/v1', [
    route('openapi.json', 'routes/api/openapi.ts'),
    route('rounds/:roundId', 'routes/api/round.ts'),
    route('rounds/:roundId/cautions', 'routes/api/round-cautions.ts'),
    route('rounds/:roundId/readings/:readingId', 'routes/api/round-reading.ts'),
    route('rounds/:roundId/closing', 'routes/api/round-closing.ts'),
    route('runs/:runId', 'routes/api/run.ts'),
    route('runs/:runId/events', 'routes/api/run-events.ts'),
  ]),

  route('healthz', 'routes/health/healthz.ts'),
  route('readyz', 'routes/health/readyz.ts'),
  route('*', 'routes/not-found.tsx'),
] satisfies RouteConfig;
