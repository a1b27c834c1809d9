/**
 * Runs the ensemble along the log. Time advances on a fixed grid, and exactly to the events, so
 * that the state at any time depends on the log alone; a late event replays from a checkpoint.
 */
import { SPEED, step } from './coach';
import type { FillEvent, FillSetup } from './contract';
import type { Ensemble } from './ensemble';
import type { EventLog } from './event-log';
import {
  takeChuckOff,
  takeChuckOn,
  takeCutIn,
  takeCutOut,
  takeLowAir,
  takeLowering,
  takeSilence,
  takeSupplyReading,
  takeTireReading,
} from './evidence';
import { startEnsemble } from './profile';
import { restHands, wander } from './renewal';

export const MEMBERS = 640;
/** The grid, s. */
export const GRID_S = 0.5;
/** Nobody has tapped for ten minutes: a coarser grid will do until the next event. */
const IDLE_AFTER_S = 600;
const IDLE_GRID_S = 2;
const SILENCE_EVERY_S = 2;
const WANDER_EVERY_S = 2;
const CHECKPOINT_EVERY_S = 20;
const MOST_CHECKPOINTS = 48;

interface Checkpoint {
  state: Ensemble;
  events: readonly FillEvent[];
}

export interface Filter {
  /** The ensemble at the last grid time or event not after `at`; not to be changed. */
  stateAt(at: number): { ensemble: Ensemble; events: readonly FillEvent[] };
}

export function createFilter(setup: FillSetup, log: EventLog, members = MEMBERS): Filter {
  const origin = startEnsemble(members, setup);
  const current = origin.clone();
  let currentEvents: readonly FillEvent[] = [];
  let checkpoints: Checkpoint[] = [];

  function restore(events: readonly FillEvent[], at: number): void {
    checkpoints = checkpoints.filter((c) => c.state.time > at || agrees(c.state, c.events, events));
    if (current.time <= at && agrees(current, currentEvents, events)) return;
    const usable = checkpoints.filter((c) => c.state.time <= at);
    const last = usable[usable.length - 1];
    current.copyFrom(last ? last.state : origin);
  }

  function remember(events: readonly FillEvent[]): void {
    const near = checkpoints.some(
      (c) => Math.abs(c.state.time - current.time) < CHECKPOINT_EVERY_S,
    );
    if (near || current.time < CHECKPOINT_EVERY_S) return;
    checkpoints.push({ state: current.clone(), events });
    checkpoints.sort((a, b) => a.state.time - b.state.time);
    if (checkpoints.length > MOST_CHECKPOINTS) {
      // Every other one of the older half goes: late events are seldom very late.
      checkpoints = checkpoints.filter((_, k) => k % 2 === 1 || k > MOST_CHECKPOINTS / 2);
    }
  }

  return {
    stateAt(at) {
      const events = log.until(at);
      restore(events, at);
      currentEvents = events;
      advance(current, events, at, setup, () => remember(events));
      return { ensemble: current, events };
    },
  };
}

/** Whether the events that a state has taken in are the first ones of this list, none before left out. */
function agrees(state: Ensemble, its: readonly FillEvent[], events: readonly FillEvent[]): boolean {
  for (let k = 0; k < state.applied; k++) if (its[k] !== events[k]) return false;
  const next = events[state.applied];
  return !next || next.at >= state.time;
}

function advance(
  e: Ensemble,
  events: readonly FillEvent[],
  at: number,
  setup: FillSetup,
  atGrid: () => void,
): void {
  for (;;) {
    const event = events[e.applied];
    const gridTime = nextGrid(e, events);
    const goal = event && event.at < gridTime ? event.at : gridTime;
    if (goal > at) return;
    if (goal > e.time) {
      step(e.members, 0, e.members.n, goal - e.time, e.controls);
      e.time = goal;
    }
    if (event && event.at < gridTime) {
      take(e, event, setup);
      e.applied++;
      continue;
    }
    if (goal % SILENCE_EVERY_S === 0) takeSilence(e, SILENCE_EVERY_S);
    if (goal % WANDER_EVERY_S === 0) {
      wander(e, WANDER_EVERY_S);
      restHands(e, WANDER_EVERY_S);
    }
    atGrid();
  }
}

/** Grid work at a time comes before the events of that time, also for events that arrive late. */
function nextGrid(e: Ensemble, events: readonly FillEvent[]): number {
  const lastEvent = e.applied > 0 ? events[e.applied - 1]!.at : 0;
  const grid = e.time - lastEvent >= IDLE_AFTER_S ? IDLE_GRID_S : GRID_S;
  return (Math.floor(e.time / grid) + 1) * grid;
}

function take(e: Ensemble, event: FillEvent, setup: FillSetup): void {
  switch (event.type) {
    case 'engine':
      e.members.speed.fill(SPEED[event.speed]);
      return;
    case 'supply-reading':
      takeSupplyReading(e, event, setup.rig);
      break;
    case 'tire-reading':
      // The path is closed while the tire is gauged: a tap was forgotten if it is on by the log.
      takeChuckOff(e);
      e.controls.bleeding = false;
      takeTireReading(e, event, setup.rig);
      break;
    case 'cut-out':
      takeCutOut(e);
      break;
    case 'cut-in':
      takeCutIn(e);
      break;
    case 'lowering':
      takeLowering(e, event.by, event.on);
      break;
    case 'chuck':
      if (event.on) takeChuckOn(e);
      else takeChuckOff(e);
      break;
    case 'bleeding':
      e.controls.bleeding = event.on;
      return;
    case 'low-air':
      takeLowAir(e, event.on);
      break;
  }
}
