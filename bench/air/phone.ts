import type { Adviser, FillEvent } from './adviser';
import { around, between, chance, type Dice } from './random';

type WithoutTime<T> = T extends unknown ? Omit<T, 'at' | 'id'> : never;
/** An event as a thumb makes it: the phone adds time and id. */
export type Tapped = WithoutTime<FillEvent>;

interface Queued {
  arrivesAt: number;
  event: FillEvent;
}

/** The taps of one fill, with the lateness of thumbs and of the way between two phones. */
export interface Phone {
  adviser: Adviser;
  dice: Dice;
  now: number;
  queue: Queued[];
  log: FillEvent[];
  taps: number;
  onEvent: (event: FillEvent) => void;
}

/** Share of taps that are forgotten, and of those that come very late. */
const FORGOTTEN = 0.02;
const VERY_LATE = 0.04;

export function newPhone(adviser: Adviser, dice: Dice): Phone {
  return { adviser, dice, now: 0, queue: [], log: [], taps: 0, onEvent: () => {} };
}

/** A tap for something just done: a moment late, now and then much later or never. */
export function tapDone(phone: Phone, event: Tapped, fromCab = false): void {
  const { dice } = phone;
  if (chance(dice, FORGOTTEN)) return;
  const late = chance(dice, VERY_LATE) ? between(dice, 3, 8) : around(dice, 0.6, 0.6);
  tapAt(phone, event, phone.now + late, fromCab);
}

/** A tap that is itself the act (a reading typed in): stamped now. */
export function tapNow(phone: Phone, event: Tapped, fromCab = false): void {
  tapAt(phone, event, phone.now, fromCab);
}

function tapAt(phone: Phone, event: Tapped, at: number, fromCab: boolean): void {
  phone.taps += 1;
  const way = fromCab ? around(phone.dice, 0.4, 0.7) : 0;
  const stamped = { ...event, at: Math.round(at * 1000) / 1000, id: `t${phone.taps}` };
  phone.queue.push({ arrivesAt: at + way, event: stamped as FillEvent });
}

/** What the phone records by itself: no thumb, no lateness, no tap. */
export function recordCall(phone: Phone, call: FillEvent): void {
  deliver(phone, call);
}

/** Hands what has arrived by now to the adviser. True when something did. */
export function deliverDue(phone: Phone, now: number): boolean {
  phone.now = now;
  if (phone.queue.every((queued) => queued.arrivesAt > now)) return false;
  const due = phone.queue.filter((queued) => queued.arrivesAt <= now);
  phone.queue = phone.queue.filter((queued) => queued.arrivesAt > now);
  for (const { event } of due) deliver(phone, event);
  return true;
}

function deliver(phone: Phone, event: FillEvent): void {
  phone.log.push(event);
  phone.onEvent(event);
  phone.adviser.apply(event);
}
