import { z } from 'zod';
import { wireFillEvent } from './wire-events';
import { idField, moment } from './wire-fields';

/** What the API answers. */

const seq = z.int().min(1);
const endedSeq = z.int().min(1).nullable();

export const roundAnswer = z.object({ roundId: idField });
export const cautionsAnswer = z.object({ roundId: idField, acknowledgedAt: moment });
export const readingAnswer = z.object({ readingId: idField });
export const closingAnswer = z.object({ roundId: idField, closedAt: moment });
export const runAnswer = z.object({ runId: idField, overlapping: z.boolean() });

/** To sending events: the number of each, in the order sent, whether stored now or before. */
export const appendAnswer = z.object({
  stored: z.array(z.object({ id: idField, seq })),
  lastSeq: z.int().min(0),
  endedSeq,
});
export type AppendAnswer = z.infer<typeof appendAnswer>;

/** One event as the server keeps it. */
const storedEvent = z.object({
  seq,
  side: z.enum(['wheel', 'cab']),
  deviceId: idField,
  event: wireFillEvent,
});
export type StoredEvent = z.infer<typeof storedEvent>;

/** To reading events. */
export const eventsAnswer = z.object({
  events: z.array(storedEvent),
  lastSeq: z.int().min(0),
  endedSeq,
});
export type EventsAnswer = z.infer<typeof eventsAnswer>;

/** A refusal after RFC 9457. */
export const problemBody = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  code: z.string(),
  errors: z.array(
    z.object({
      index: z.int().min(0).optional().describe('place in the batch'),
      field: z.string(),
      value: z.unknown().optional(),
      expected: z.string(),
    }),
  ),
});
