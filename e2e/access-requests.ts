import { randomUUID } from 'node:crypto';
import { afterwardsKeys, versioned } from '~/fill/wire';
import { batchOf, eventOf, readingsOf, runBodyOf } from '../tests/factories/run';
import type { World } from './access-world';

/** What is sent: a form as a page sends it, or JSON as a program does. */
export interface Sent {
  form?: readonly (readonly [string, string])[];
  json?: unknown;
  /** In place of the world's own round or fill: writes that make one need a new id. */
  ids?: { roundId?: string; runId?: string };
  /** The write needs a fill that is there already. */
  onFill?: boolean;
}

const form = (fields: Record<string, string>): Sent => ({ form: Object.entries(fields) });
const tire = { size: '295/75R22.5', sidewallLimit: '120', wheelLimit: '125', volume: '' };
const position = 'steer-left';
const now = () => new Date().toISOString();

const axle = (name: string) =>
  Object.entries({ ...tire, target: '100' }).map(
    ([field, value]) => [`${name}.${field}`, value] as const,
  );

const place = {
  place: 'Larch Hollow, pitch 14',
  timeZone: 'America/Denver',
};

/** A good request for each write, so that only who asks decides. Sign-in's own are left unfinished. */
export const requests: Record<string, (world: World) => Sent> = {
  'POST /login': () => form({ email: 'nobody' }),
  'POST /login/code': () => form({ code: '12' }),
  'POST /logout': () => form({}),
  'POST /account': () => form({ intent: 'save', name: 'Wanda Walker', pressureUnit: 'psi' }),
  'POST /coaches/new': () => ({
    form: [
      ['name', 'Another one'],
      ['layout', 'two-axles'],
      ...axle('steer'),
      ...axle('drive'),
      ...axle('tag'),
    ],
  }),
  'POST /coaches/:coachId/tires correct': () => form({ position, what: 'corrected', ...tire }),
  'POST /coaches/:coachId/tires replace': () => form({ position, what: 'replaced', ...tire }),
  'POST /coaches/:coachId/tires move': () =>
    form({ intent: 'move', position, with: 'steer-right' }),
  'POST /coaches/:coachId/targets': () => form({ steer: '105', drive: '95' }),
  'POST /coaches/:coachId/air rig': () =>
    form({
      intent: 'rig',
      hose: 'Grey hose',
      chuck: 'Closed',
      gauge: 'Tee gauge',
      gaugePlace: 'at-chuck',
      hasValve: 'no',
      stepKpa: '1',
    }),
  'POST /coaches/:coachId/air lowering': () => form({ intent: 'lowering', lowerBy: 'drain' }),
  'POST /coaches/:coachId/air fitting': () => form({ intent: 'fitting', outcome: 'no-air' }),
  'POST /coaches/:coachId/settings': () => form({ name: 'Its new name', toleranceKpa: '3' }),
  'POST /coaches/:coachId/settings remove': ({ coachName }) =>
    form({ intent: 'remove', confirm: coachName }),
  'POST /coaches/:coachId/rounds/new': () =>
    form({ ...place, altitudeM: '1000', ambientC: '50', withHelper: 'no' }),
  'POST /rounds/:roundId cautions': () => form({ intent: 'cautions' }),
  'POST /rounds/:roundId reading': ({ tireId }) => form({ intent: 'reading', tireId, kpa: '100' }),
  'POST /rounds/:roundId fill': ({ tireId }) => form({ intent: 'fill', tireId }),
  'POST /rounds/:roundId close': () => ({
    form: [['intent', 'close'], ...afterwardsKeys.map((key) => ['afterwards', key] as const)],
  }),
  'PUT /api/v1/rounds/:roundId': ({ coachId }) => ({
    ids: { roundId: randomUUID() },
    json: versioned({
      ...place,
      coachId,
      startedAt: now(),
      altitudeM: 300,
      ambientC: 10,
      withHelper: false,
      deviceId: randomUUID(),
    }),
  }),
  'PUT /api/v1/rounds/:roundId/cautions': () => ({ json: versioned({ acknowledgedAt: now() }) }),
  'PUT /api/v1/rounds/:roundId/readings/:readingId': ({ tireId }) => ({
    json: versioned({ tireId, kpa: 700, warm: false, readAt: now() }),
  }),
  'PUT /api/v1/rounds/:roundId/closing': () => ({
    json: versioned({ closedAt: now(), afterwards: [...afterwardsKeys] }),
  }),
  'PUT /api/v1/runs/:runId': ({ roundId, tireId }) => ({ json: runBodyOf(roundId, tireId) }),
  'POST /api/v1/runs/:runId/events tap': () => ({ onFill: true, json: batchOf(readingsOf(1)) }),
  'POST /api/v1/runs/:runId/events end': () => ({
    onFill: true,
    json: batchOf([eventOf({ type: 'ended', how: 'stopped' })]),
  }),
  'POST /*': () => form({}),
};
