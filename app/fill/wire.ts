import { z } from 'zod';
import { runKinds, wireFillEvent } from './wire-events';
import {
  between,
  exactly,
  gaugePressure,
  idField,
  moment,
  oneOf,
  text,
  version,
  wireVersion,
  yesNo,
} from './wire-fields';
import { wireSetup } from './wire-setup';

export type { AppendAnswer, EventsAnswer, StoredEvent } from './wire-answers';

/** Bodies of the API under `/api/v1`, for the phone and the server alike. kPa, °C, m, ms. */

/** What is to be ticked before a round closes, in the order in which it is done. */
export const afterwardsKeys = [
  'chuck-off',
  'caps-on',
  'hose-stowed',
  'fitting-capped',
  'supply-at-cut-out',
  'low-air-out',
  'chocks-away',
] as const;
export type AfterwardsKey = (typeof afterwardsKeys)[number];

/** Most events in one batch: below 200 kB. */
export const largestBatch = 500;

const timeZone = text(1, 60, 'a time zone, such as America/Denver').refine(isTimeZone, {
  error: 'a time zone, such as America/Denver',
});

/** `PUT /rounds/:roundId` */
export const roundBody = exactly('the start of a round', {
  v: version,
  coachId: idField,
  startedAt: moment,
  place: text(0, 120, 'a place of up to 120 letters; it may be empty'),
  altitudeM: between(-500, 5000, 'an altitude of -500 to 5000 m'),
  ambientC: between(-50, 60, 'a temperature of -50 to 60 °C'),
  timeZone,
  withHelper: yesNo,
  deviceId: idField,
});
export type RoundBody = z.infer<typeof roundBody>;

/** `PUT /rounds/:roundId/cautions` */
export const cautionsBody = exactly('the cautions of a round', {
  v: version,
  acknowledgedAt: moment,
});
export type CautionsBody = z.infer<typeof cautionsBody>;

/** `PUT /rounds/:roundId/readings/:readingId` */
export const readingBody = exactly('a cold reading', {
  v: version,
  tireId: idField,
  kpa: gaugePressure,
  warm: yesNo,
  readAt: moment,
});
export type ReadingBody = z.infer<typeof readingBody>;

/** `PUT /rounds/:roundId/closing` */
export const closingBody = exactly('the closing of a round', {
  v: version,
  closedAt: moment,
  afterwards: z
    .array(oneOf(afterwardsKeys), { error: `all of ${afterwardsKeys.join(', ')}` })
    .refine((ticked) => afterwardsKeys.every((key) => ticked.includes(key)), {
      error: `all of ${afterwardsKeys.join(', ')}`,
    }),
});
export type ClosingBody = z.infer<typeof closingBody>;

/** `PUT /runs/:runId` */
export const runBody = exactly('the start of a fill', {
  v: version,
  kind: oneOf(runKinds),
  roundId: idField,
  tireId: idField,
  startedAt: moment,
  setup: wireSetup,
  engineVersion: text(1, 60, "the engine's version, 1 to 60 letters"),
  deviceId: idField,
});
export type RunBody = z.infer<typeof runBody>;

/** `POST /runs/:runId/events` */
export const eventsBody = exactly('a batch of events', {
  v: version,
  deviceId: idField,
  events: z
    .array(wireFillEvent, { error: `a list of 1 to ${largestBatch} events` })
    .min(1, { error: `a list of 1 to ${largestBatch} events` })
    .max(largestBatch, { error: `a list of 1 to ${largestBatch} events` }),
});
export type EventsBody = z.infer<typeof eventsBody>;

/** `GET /runs/:runId/events?after=N` */
export const eventsQuery = exactly('the query', {
  after: z.coerce
    .number({ error: 'a whole number of 0 or more: the last number that you have' })
    .int({ error: 'a whole number of 0 or more: the last number that you have' })
    .min(0, { error: 'a whole number of 0 or more: the last number that you have' })
    .default(0),
});

/** A body with its version, for sending. */
export const versioned = <Body extends object>(body: Body) =>
  ({ v: wireVersion, ...body }) as const;

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}
