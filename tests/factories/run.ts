import { randomUUID } from 'node:crypto';
import type { Actor } from '~/access/can';
import { ENGINE_VERSION, type FillEvent, type FillSetup } from '~/air';
import { appendEvents } from '~/commands/append-events.server';
import { startFill } from '~/commands/start-fill.server';
import type { NewFillEvent } from '~/fill/live-driver';
import { type EventsBody, type RunBody, versioned } from '~/fill/wire';
import type { Ending, WireEvent } from '~/fill/wire-events';
import type { WheelPosition } from '~/loads';
import { createCoach } from './coach';
import { createRound, type NewRoundFacts } from './round';
import { createUser } from './user';

/** A set-up that any coach could have: 100 to 105 psi in a tire of 140 L. */
export const usualSetup: FillSetup = {
  tire: { startKpa: 689.5, targetKpa: 724, toleranceKpa: 7, volumeL: 140, limitKpa: 827 },
  rig: { gauge: 'above-valve', valve: false, stepKpa: 6.9, hose: 'a', chuck: 'b', gaugeName: 'c' },
  lowerBy: ['drain'],
  crew: { helper: true },
  seed: 7,
};

export interface NewFillFacts {
  runId?: string;
  position?: WheelPosition;
  startedAt?: Date;
  setup?: FillSetup;
}

/** An owner with a coach and an open round. */
export async function createOpenRound(facts: NewRoundFacts = {}) {
  const owner = await createUser();
  const { coachId, actor, tires } = await createCoach(owner.id);
  const round = await createRound(coachId, facts);
  return { owner, coachId, actor, tires, roundId: round.id };
}

/** What a phone sends to start a fill. */
export function runBodyOf(roundId: string, tireId: string, facts: NewFillFacts = {}): RunBody {
  return versioned({
    kind: 'fill' as const,
    roundId,
    tireId,
    startedAt: (facts.startedAt ?? new Date()).toISOString(),
    setup: (facts.setup ?? usualSetup) as RunBody['setup'],
    engineVersion: ENGINE_VERSION,
    deviceId: randomUUID(),
  });
}

/** A fill that has just begun, in a round and on a coach of its own unless some are given. */
export async function createFillFor(
  place: Awaited<ReturnType<typeof createOpenRound>>,
  { runId = randomUUID(), position = 'steer-left', ...facts }: NewFillFacts = {},
) {
  const body = runBodyOf(place.roundId, place.tires[position], facts);
  const started = await startFill(place.actor, runId, body);
  return { ...place, ...started, body };
}

export const createOpenFill = async (facts: NewFillFacts = {}) =>
  createFillFor(await createOpenRound(), facts);

type Sent = NewFillEvent | { type: 'ended'; how: Ending };
let deviceSeq = 0;

/** An event as a phone sends it, `atMs` after the fill's start. */
export function eventOf(event: Sent, atMs = 1000, id: string = randomUUID()): WireEvent {
  deviceSeq += 1;
  const deviceTime = new Date(1_790_000_000_000 + atMs).toISOString();
  return { id, ...event, atMs, deviceSeq, deviceTime, offsetMs: 12, suspect: false } as WireEvent;
}

/** The engine's own events, as a phone would have sent them. */
export const eventsOf = (events: readonly FillEvent[]): WireEvent[] =>
  events.map(({ at, id, ...own }) => eventOf(own, Math.round(at * 1000), id));

/** `count` readings of the supply, a second apart. */
export const readingsOf = (count: number, fromMs = 1000): WireEvent[] =>
  Array.from({ length: count }, (_, place) =>
    eventOf(
      { type: 'supply-reading', source: 'wheel-gauge', kpa: 700 + place },
      fromMs + place * 1000,
    ),
  );

/** What a phone sends of a log. */
export const batchOf = (events: WireEvent[], deviceId: string = randomUUID()): EventsBody =>
  versioned({ deviceId, events });

/** Ends a fill `atMs` after its start. */
export const endFillAt = (actor: Actor, runId: string, atMs: number, how: Ending = 'stopped') =>
  appendEvents(actor, runId, batchOf([eventOf({ type: 'ended', how }, atMs)]));
