import { ENGINE_VERSION, type FillSetup } from '~/air';
import type { WheelPosition } from '~/loads';
import { newId } from './ids';
import type { NewFillEvent } from './live-driver';
import type { EventCommand, PutCommand, Subject } from './outbox-items';
import { type Phone, thisPhone } from './phone';
import { addToLog, changeRound, putRound, putRun, type RunState } from './store';
import {
  type AfterwardsKey,
  type CautionsBody,
  type ClosingBody,
  type ReadingBody,
  type RoundBody,
  type RunBody,
  versioned,
} from './wire';
import type { Ending, WireEvent } from './wire-events';

/**
 * What can be recorded on a phone. Each command changes the phone's own store at once and goes into
 * the outbox; none waits for the server, and none fails for want of signal.
 */

export interface NewRound {
  coachId: string;
  place: string;
  /** Metres above the sea. */
  altitudeM: number;
  /** The air around, °C. */
  ambientC: number;
  /** IANA name, such as America/Denver. */
  timeZone: string;
  withHelper: boolean;
}

/** Starts a round now; returns its id. */
export function startRound(round: NewRound, phone: Phone = thisPhone()): string {
  const id = newId();
  const startedAt = nowOf(phone);
  const none = { cautionsAt: null, closedAt: null, afterwards: [], readings: [] };
  putRound(phone.store, { id, ...round, startedAt, ...none });
  const body: RoundBody = versioned({ ...round, startedAt, deviceId: phone.device.id });
  phone.outbox.add([put('round', id, `rounds/${id}`, body, null)]);
  return id;
}

/** The cautions of a round have been read. */
export function acknowledgeCautions(roundId: string, phone: Phone = thisPhone()): void {
  const acknowledgedAt = nowOf(phone);
  changeRound(phone.store, roundId, (round) => ({ ...round, cautionsAt: acknowledgedAt }));
  const body: CautionsBody = versioned({ acknowledgedAt });
  const id = `${roundId} cautions`;
  phone.outbox.add([put('cautions', id, `rounds/${roundId}/cautions`, body, roundId)]);
}

/** What a gauge showed on a tire before the day's heat and driving; returns the reading's id. */
export function recordColdReading(
  roundId: string,
  reading: { tireId: string; kpa: number; warm: boolean },
  phone: Phone = thisPhone(),
): string {
  const id = newId();
  const readAt = nowOf(phone);
  changeRound(phone.store, roundId, (round) => ({
    ...round,
    readings: [...round.readings, { id, ...reading, readAt }],
  }));
  const body: ReadingBody = versioned({ ...reading, readAt });
  phone.outbox.add([put('reading', id, `rounds/${roundId}/readings/${id}`, body, roundId)]);
  return id;
}

/** Closes a round with its list of afterwards, all of it ticked. */
export function closeRound(
  roundId: string,
  afterwards: readonly AfterwardsKey[],
  phone: Phone = thisPhone(),
): void {
  const closedAt = nowOf(phone);
  changeRound(phone.store, roundId, (round) => ({ ...round, closedAt, afterwards }));
  const body: ClosingBody = versioned({ closedAt, afterwards: [...afterwards] });
  const id = `${roundId} closing`;
  phone.outbox.add([put('closing', id, `rounds/${roundId}/closing`, body, roundId)]);
}

export interface NewFill {
  roundId: string;
  coachId: string;
  tireId: string;
  position: WheelPosition;
  /** See `composeFillSetup`; frozen from here on. */
  setup: FillSetup;
}

/** Starts a fill of one tire now; returns its id, which is the address of its screen. */
export function startFill(fill: NewFill, phone: Phone = thisPhone()): string {
  const id = newId();
  const { coachId, position, ...told } = fill;
  const common = {
    ...told,
    kind: 'fill' as const,
    startedAt: nowOf(phone),
    engineVersion: ENGINE_VERSION,
    deviceId: phone.device.id,
  };
  phone.times.begin(id);
  putRun(phone.store, { id, coachId, position, ...common, mayEnd: true, log: [] });
  const body: RunBody = versioned({ ...common, setup: common.setup as RunBody['setup'] });
  phone.outbox.add([put('run', id, `runs/${id}`, body, fill.roundId)]);
  return id;
}

/**
 * Records an event of a fill; returns its id.
 * @param at seconds since the fill's start; now where absent
 */
export function tap(
  runId: string,
  event: NewFillEvent,
  at?: number,
  phone: Phone = thisPhone(),
): string {
  return record(phone, runId, event, at);
}

/** Takes back an event, now. It stays in the log and counts no longer. */
export function takeBack(runId: string, eventId: string, phone: Phone = thisPhone()): string {
  return record(phone, runId, { type: 'taken-back', of: eventId }, undefined);
}

/** Ends a fill now. */
export function endFill(runId: string, how: Ending, phone: Phone = thisPhone()): string {
  return record(phone, runId, { type: 'ended', how }, undefined);
}

type NewEvent = NewFillEvent | { type: 'ended'; how: Ending };

function record(phone: Phone, runId: string, event: NewEvent, at: number | undefined): string {
  const run = runOf(phone, runId);
  const atMs = Math.round(at === undefined ? phone.times.elapsedMs(run) : Math.max(0, at * 1000));
  const wire = {
    id: newId(),
    ...event,
    atMs,
    deviceSeq: phone.device.nextSeq(),
    deviceTime: new Date(phone.clock.wall()).toISOString(),
    offsetMs: sendable(phone.clock.offsetMs()),
    suspect: phone.clock.suspect(),
  } as WireEvent;
  const deviceId = phone.device.id;
  addToLog(phone.store, runId, [{ event: wire, deviceId, side: 'wheel', seq: null }]);
  const command: EventCommand = {
    subject: 'event',
    id: wire.id,
    address: `/api/v1/runs/${runId}/events`,
    needs: runId,
    deviceId,
    body: wire,
  };
  phone.outbox.add([command]);
  return wire.id;
}

/** More than 24 days apart is no offset but a clock that was never set. */
function sendable(offsetMs: number | null): number | null {
  return offsetMs !== null && Math.abs(offsetMs) < 2_147_483_647 ? offsetMs : null;
}

function runOf(phone: Phone, runId: string): RunState {
  const run = phone.store.getState().runs[runId];
  if (!run) throw new Error(`fill ${runId} is not on this phone`);
  return run;
}

const nowOf = (phone: Phone) => new Date(phone.clock.serverNow()).toISOString();

function put(
  subject: Exclude<Subject, 'event'>,
  id: string,
  path: string,
  body: object,
  needs: string | null,
): PutCommand {
  return { subject, id, address: `/api/v1/${path}`, body, needs };
}
