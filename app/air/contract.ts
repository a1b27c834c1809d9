/**
 * What other parts, and checks of this project, call. Pressures are gauge kPa unless the name says
 * `Abs`; times are seconds since the fill's start; volumes are litres. Everything is plain JSON.
 */
import type { Reason } from './reasons';

/** Names of what the figures were learned with. */
export interface RigKey {
  hose?: string;
  chuck?: string;
  gauge?: string;
}

export interface AirProfile {
  schema: number;
  key: RigKey;
  /** How many fills have taught it. */
  fills: number;
  fields: string[];
  members: number[][];
}

export interface SupplyState {
  schema: number;
  fields: string[];
  members: number[][];
}

export type EngineSpeed = 'off' | 'idle' | 'fast-idle';
export type LowerBy = 'pedal' | 'drain';

/** The same id counts once; ties go by at, then type, then id or content. */
export interface Tap {
  at: number;
  id?: string;
}

export type FillEvent = Tap &
  (
    | { type: 'engine'; speed: EngineSpeed }
    | {
        type: 'supply-reading';
        source: 'wheel-gauge' | 'dash-gauge' | 'sensor';
        kpa: number;
        stepKpa?: number;
        how?: 'offered' | 'typed';
      }
    /** The purge was heard. */
    | { type: 'cut-out' }
    /** The compressor was seen or heard to load. */
    | { type: 'cut-in' }
    | { type: 'lowering'; by: LowerBy; on: boolean }
    /** The air path, by chuck or by shut-off valve. */
    | { type: 'chuck'; on: boolean }
    /** Path closed. */
    | { type: 'tire-reading'; kpa: number; stepKpa?: number }
    | { type: 'bleeding'; on: boolean }
    /** A helper came or left. */
    | { type: 'crew'; helper: boolean }
    /** Alone: where the person is. */
    | { type: 'place'; where: 'seat' | 'wheel' }
    /** The warning came on or went out. */
    | { type: 'low-air'; on: boolean }
    /** What the screen said, for reaction times and for the record. */
    | { type: 'call-shown'; call: Call }
    /** Undo of the event with that id. */
    | { type: 'taken-back'; of: string }
  );

export interface FillSetup {
  tire: {
    startKpa: number;
    targetKpa: number;
    toleranceKpa: number;
    volumeL: number;
    limitKpa?: number;
    warm?: boolean;
    /** Facts of the wheel that slow the air: an extension, a flow-through cap. */
    slowValve?: boolean;
  };
  rig?: {
    gauge: 'at-chuck' | 'above-valve' | 'below-valve' | 'dash-only';
    valve: boolean;
    stepKpa?: number;
    /** Names of what is used: what was learned with another hose, chuck or gauge is not taken over. */
    hose?: string;
    chuck?: string;
    gaugeName?: string;
  };
  /** What this coach allows; none: never ask. */
  lowerBy?: LowerBy[];
  crew?: { helper: boolean; walkSeconds?: number };
  /** `supplyAt()` of the fill before, in the same round. */
  supply?: SupplyState;
  /** 101.325 where absent. */
  atmosphereKpa?: number;
  profile?: AirProfile;
  seed?: number;
}

export type Call =
  | 'read-supply'
  | 'wait'
  | 'lower-supply'
  | 'stop-lowering'
  | 'chuck-on'
  | 'keep-on'
  | 'chuck-off'
  | 'gauge-tire'
  | 'bleed'
  | 'check'
  | 'done'
  | 'cannot-reach';

export interface Spread {
  p10: number;
  p50: number;
  p90: number;
}

export type CabCall =
  | 'nothing'
  | 'start-engine'
  | 'set-fast-idle'
  | 'lower-supply'
  | 'stop-lowering'
  | 'read-dash';

export interface Advice {
  /** For the wheel, and for one person alone. */
  call: Call;
  cab?: CabCall;
  /** With lower-supply. */
  by?: LowerBy;
  /** A stable code; the words for it live with the screen. */
  reason: Reason;
  /** Seconds until the call is expected to change. */
  changeIn?: Spread;
  /** Seconds until a reading is wanted; 0 or less: now. */
  readIn?: number;
  supplyKpa: Spread;
  /** Settled. */
  tireKpa: Spread;
  /** Probability that the compressor is loaded. */
  loaded: number;
  /** Probability that supply is above the tire. */
  flowsIn: number;
  /** With `cannot-reach`: the highest pressure that this governor can give this tire. */
  reachKpa?: Spread;
  /** While the chuck is on: off by then (seconds since the start) even if the phone stops. */
  offBy?: number;
  /** What the governor is believed to do. */
  cutInKpa?: Spread;
  cutOutKpa?: Spread;
}

export interface Fill {
  /** Late or out of order: the answer does not depend on the order of arrival. */
  apply(event: FillEvent): void;
  /** Nor on how often, or when, advice was asked before. */
  advise(at: number): Advice;
  profile(): AirProfile;
  supplyAt(at: number): SupplyState;
}
