/** What the log says outright, as against what the ensemble believes. */
import type { Call, EngineSpeed, FillEvent, FillSetup, LowerBy } from './contract';

export interface SeenReading {
  at: number;
  kpa: number;
  source: 'wheel-gauge' | 'dash-gauge' | 'sensor';
  /** Whether the air path was open then. */
  flowing: boolean;
}

export interface Hold {
  on: number;
  off: number | undefined;
}

export interface Facts {
  speed: EngineSpeed | undefined;
  speedAt: number;
  chuckOn: boolean;
  holds: Hold[];
  lowering: LowerBy | undefined;
  loweringSince: number;
  loweringEnded: number;
  /** Whether fast idle may have been lost on the pedal since it was last tapped. */
  pedalSinceSpeed: boolean;
  bleeding: boolean;
  bledAt: number;
  helper: boolean;
  atSeat: boolean;
  lowAir: boolean;
  readings: SeenReading[];
  /** The tire gauged, latest last. */
  gauged: { at: number; kpa: number }[];
  cutOuts: number[];
  cutIns: number[];
  /** The call that the screen last said, and since when. */
  shown: Call | undefined;
  shownAt: number;
  /** Since when "take it off" has been shown in this hold. */
  offShownAt: number | undefined;
  /** Seconds from a shown "take it off" to the tap, latest last. */
  reactions: number[];
}

const NEVER = -1e6;
/** A tap later than this after the call was forgotten at first, and tells no reaction, s. */
const LONGEST_REACTION_S = 15;

export function readFacts(events: readonly FillEvent[], setup: FillSetup): Facts {
  const facts: Facts = {
    speed: undefined,
    speedAt: NEVER,
    chuckOn: false,
    holds: [],
    lowering: undefined,
    loweringSince: NEVER,
    loweringEnded: NEVER,
    pedalSinceSpeed: false,
    bleeding: false,
    bledAt: NEVER,
    helper: setup.crew?.helper ?? false,
    atSeat: false,
    lowAir: false,
    readings: [],
    gauged: [],
    cutOuts: [],
    cutIns: [],
    shown: undefined,
    shownAt: NEVER,
    offShownAt: undefined,
    reactions: [],
  };
  for (const event of events) {
    if (event.type === 'call-shown') noteShown(facts, event);
    else note(facts, event);
  }
  return facts;
}

function noteShown(facts: Facts, event: Extract<FillEvent, { type: 'call-shown' }>): void {
  facts.shown = event.call;
  facts.shownAt = event.at;
  if (event.call === 'chuck-off') facts.offShownAt ??= event.at;
  else if (event.call !== 'check') facts.offShownAt = undefined;
}

function note(facts: Facts, event: FillEvent): void {
  switch (event.type) {
    case 'engine':
      facts.speed = event.speed;
      facts.speedAt = event.at;
      facts.pedalSinceSpeed = facts.lowering === 'pedal';
      return;
    case 'supply-reading':
      facts.readings.push({
        at: event.at,
        kpa: event.kpa,
        source: event.source,
        flowing: facts.chuckOn,
      });
      return;
    case 'cut-out':
      facts.cutOuts.push(event.at);
      return;
    case 'cut-in':
      facts.cutIns.push(event.at);
      return;
    case 'lowering':
      noteLowering(facts, event);
      break;
    case 'chuck':
      noteChuck(facts, event.at, event.on);
      break;
    case 'tire-reading':
      noteChuck(facts, event.at, false);
      noteBleeding(facts, event.at, false);
      facts.gauged.push({ at: event.at, kpa: event.kpa });
      return;
    case 'bleeding':
      noteBleeding(facts, event.at, event.on);
      break;
    case 'crew':
      facts.helper = event.helper;
      return;
    case 'place':
      facts.atSeat = event.where === 'seat';
      return;
    case 'low-air':
      facts.lowAir = event.on;
  }
}

function noteLowering(facts: Facts, event: Extract<FillEvent, { type: 'lowering' }>): void {
  if (event.on) {
    if (!facts.lowering) facts.loweringSince = event.at;
    facts.lowering = event.by;
    if (event.by === 'pedal') facts.pedalSinceSpeed = true;
  } else if (facts.lowering) {
    facts.lowering = undefined;
    facts.loweringEnded = event.at;
  }
}

function noteChuck(facts: Facts, at: number, on: boolean): void {
  if (on === facts.chuckOn) return;
  facts.chuckOn = on;
  const shownFor = at - (facts.offShownAt ?? NEVER);
  if (!on && shownFor < LONGEST_REACTION_S) facts.reactions.push(shownFor);
  facts.offShownAt = undefined;
  if (on) facts.holds.push({ on: at, off: undefined });
  else facts.holds[facts.holds.length - 1]!.off = at;
}

function noteBleeding(facts: Facts, at: number, on: boolean): void {
  if (on || facts.bleeding) facts.bledAt = at;
  facts.bleeding = on;
}

/** When the tire last gained or lost air by hand: the end of the last hold or bleeding. */
export function lastTouched(facts: Facts): number {
  const hold = facts.holds[facts.holds.length - 1];
  return Math.max(hold ? (hold.off ?? hold.on) : NEVER, facts.bledAt);
}

/** The reading that proves the present state of the tire; the start counts while nothing was done. */
export function proof(facts: Facts, setup: FillSetup): { at: number; kpa: number } | undefined {
  const touched = lastTouched(facts);
  const last = facts.gauged[facts.gauged.length - 1];
  if (last && last.at >= touched && !facts.chuckOn && !facts.bleeding) return last;
  if (!last && touched === NEVER) return { at: 0, kpa: setup.tire.startKpa };
  return undefined;
}
