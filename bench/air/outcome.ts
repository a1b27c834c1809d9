import { activeTire, settledKpa, type World } from './world';

/** Whether a true pressure lay inside the adviser's 80 % band, counted. */
export interface Coverage {
  inside: number;
  asked: number;
}

/** What one fill came to. Pressures kPa, times s. */
export interface FillOutcome {
  coach: number;
  hard: boolean;
  /** 0 to 3 in the first round, 4 to 7 in the next. */
  tire: number;
  reachable: boolean;
  done: boolean;
  /** Gauged within tolerance after the last hold. */
  proven: boolean;
  saidUnreachable: boolean;
  seconds: number;
  perfectSeconds: number;
  putOn: number;
  bled: boolean;
  errorKpa: number;
  lostKpa: number;
  overLimit: boolean;
  taps: number;
  supplyBand: Coverage;
  tireBand: Coverage;
  adviseMs: number[];
}

/** The part of an outcome that is read off the world when a fill ends. */
export function readOutcome(world: World, tire: number, perfectSeconds: number) {
  const plan = activeTire(world);
  return {
    coach: world.coach.id,
    hard: world.coach.hard,
    tire,
    reachable: plan.reachable,
    perfectSeconds,
    errorKpa: Math.abs(settledKpa(world) - plan.targetKpa),
    lostKpa: world.lostKpa[world.active]!,
  };
}

export function noCoverage(): Coverage {
  return { inside: 0, asked: 0 };
}
