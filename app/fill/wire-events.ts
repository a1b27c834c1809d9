import { z } from 'zod';
import type { Call } from '~/air';
import {
  exactly,
  gaugePressure,
  idField,
  longestRunMs,
  moment,
  oneOf,
  stepKpa,
  whole,
  yesNo,
} from './wire-fields';

/** Why a fill ended. */
const endings = ['done', 'stopped', 'cannot-reach'] as const;
export type Ending = (typeof endings)[number];

const calls = [
  'read-supply',
  'wait',
  'lower-supply',
  'stop-lowering',
  'chuck-on',
  'keep-on',
  'chuck-off',
  'gauge-tire',
  'bleed',
  'check',
  'done',
  'cannot-reach',
] as const satisfies readonly Call[];

/** Largest whole number that PostgreSQL's `integer` holds: 24 days in milliseconds. */
const mostInteger = 2_147_483_647;

/** What every event carries beside its own fields. */
const stamp = {
  id: idField,
  atMs: whole(
    0,
    longestRunMs,
    `a whole number of milliseconds since the fill's start, 0 to ${longestRunMs} (24 h)`,
  ),
  deviceSeq: whole(
    0,
    mostInteger,
    `a whole number of 0 to ${mostInteger} that the device counts up`,
  ),
  deviceTime: moment,
  offsetMs: whole(
    -mostInteger,
    mostInteger,
    "whole milliseconds from the device's clock to the server's, or null when not known",
  ).nullable(),
  suspect: yesNo,
};

function event<Type extends string, Fields extends z.ZodRawShape>(type: Type, fields: Fields) {
  return exactly(`an event "${type}"`, { type: z.literal(type), ...stamp, ...fields });
}

const fillEventTypes = [
  event('engine', { speed: oneOf(['off', 'idle', 'fast-idle']) }),
  event('supply-reading', {
    source: oneOf(['wheel-gauge', 'dash-gauge', 'sensor']),
    kpa: gaugePressure,
    stepKpa: stepKpa.optional(),
    how: oneOf(['offered', 'typed']).optional(),
  }),
  event('cut-out', {}),
  event('cut-in', {}),
  event('lowering', { by: oneOf(['pedal', 'drain']), on: yesNo }),
  event('chuck', { on: yesNo }),
  event('tire-reading', { kpa: gaugePressure, stepKpa: stepKpa.optional() }),
  event('bleeding', { on: yesNo }),
  event('crew', { helper: yesNo }),
  event('place', { where: oneOf(['seat', 'wheel']) }),
  event('low-air', { on: yesNo }),
  event('call-shown', { call: oneOf(calls) }),
  event('taken-back', { of: idField }),
  event('ended', { how: oneOf(endings) }),
] as const;

const typeNames = fillEventTypes.map((schema) => schema.shape.type.value);

/** One event of a run of kind `fill`, as it travels. */
export const wireFillEvent = z.discriminatedUnion('type', fillEventTypes, {
  error: (issue) =>
    issue.code === 'invalid_union' ? `one of ${typeNames.join(', ')}` : 'an event of a fill',
});
export type WireEvent = z.infer<typeof wireFillEvent>;

/** What a run's log may hold, by its kind. */
const eventsOfKind = { fill: wireFillEvent } as const;
export type RunKind = keyof typeof eventsOfKind;
export const runKinds = ['fill'] as const satisfies readonly RunKind[];
