/** The running state of the filter: members, weights, draws, time. A checkpoint is a copy of it. */
import { createDraws, type Draws } from './arithmetic';
import {
  type Controls,
  createMembers,
  FITTING,
  type Members,
  setSourceAbs,
  sourceAbs,
} from './coach';
import { setSupply } from './priors';

export class Ensemble {
  readonly members: Members;
  readonly weights: Float64Array;
  readonly draws: Draws;
  readonly controls: Controls;
  /** Seconds since the fill's start. */
  time = 0;
  /** How many events of the log are in. */
  applied = 0;
  /** When a purge was last tapped, and whether a supply reading has been seen. */
  heardAt = -1e6;
  supplySeen = false;
  /** A sensor was read: it has no error of its own. */
  sensorSeen = false;

  constructor(
    n: number,
    seed: number,
    atmosphereKpa: number,
    readonly tireL: number,
    readonly slowValve: boolean,
  ) {
    this.members = createMembers(n);
    this.weights = new Float64Array(n).fill(1 / n);
    this.draws = createDraws(seed);
    this.controls = { pedal: false, drain: false, bleeding: false, atmosphereKpa };
  }

  copyFrom(other: Ensemble): void {
    this.members.all.set(other.members.all);
    this.weights.set(other.weights);
    this.draws.state = other.draws.state;
    Object.assign(this.controls, other.controls);
    this.time = other.time;
    this.applied = other.applied;
    this.heardAt = other.heardAt;
    this.supplySeen = other.supplySeen;
    this.sensorSeen = other.sensorSeen;
  }

  clone(): Ensemble {
    const copy = new Ensemble(
      this.members.n,
      0,
      this.controls.atmosphereKpa,
      this.tireL,
      this.slowValve,
    );
    copy.copyFrom(this);
    return copy;
  }

  sourceOf(i: number): number {
    return sourceAbs(this.members, i);
  }

  /** How far the service tanks stand above the supply tank (they keep what it loses). */
  lagOfService(i: number): number {
    return Math.max(0, this.members.serviceAbs[i]! - this.members.supplyAbs[i]!);
  }

  /** Sets the tanks so that the fitting's tank has this pressure. */
  placeSupply(i: number, abs: number, serviceLag: number): void {
    setSupply(this.members, i, abs);
    if (this.members.fitting[i] !== FITTING.service) {
      this.members.serviceAbs[i] = abs + serviceLag;
    }
    setSourceAbs(this.members, i, abs);
  }

  /** Moves all tanks of a member by the same amount. */
  shiftSupply(i: number, kpa: number): void {
    const m = this.members;
    const floor = this.controls.atmosphereKpa;
    m.supplyAbs[i] = Math.max(floor, m.supplyAbs[i]! + kpa);
    m.serviceAbs[i] = Math.max(floor, m.serviceAbs[i]! + kpa);
    m.accessoryAbs[i] = Math.max(floor, m.accessoryAbs[i]! + kpa);
  }
}
