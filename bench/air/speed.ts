import * as mathjs from 'mathjs';
import type { AirProfile, Fill, FillEvent, FillSetup } from '../../app/air/contract';
import { type Coach, chuckSideC, drawCoach } from './coach';
import { roundsByCrew } from './crew-round';
import { quantile } from './figures';
import { flowThrough, inSeries } from './flow';
import { Solver } from './odex';
import type { Options } from './options';
import { readClock, startClock } from './stopwatch';

/** Fills timed, from this many coaches, one round each. */
const TIMED_COACHES = 6;
/** Tolerance of the reference integrations, relative: finer than any gauge by far. */
const TOLERANCE = 1e-6;
const REPEATS = 5;

interface Recorded {
  coach: Coach;
  tire: number;
  setup: FillSetup;
  events: FillEvent[];
  seconds: number;
}

/**
 * Milliseconds of the engine, and the same fill integrated for one single coach, without governor
 * or doubt, by two general libraries in the same run.
 */
export async function printSpeed(options: Options): Promise<void> {
  const { createFill } = await import('../../app/air/index');
  const recorded: Recorded[] = [];
  const ms: number[] = [];
  for (let id = options.from; id < options.from + TIMED_COACHES; id++) {
    const outcomes = roundsByCrew(id, {
      habits: options.habits,
      rounds: 1,
      createFill: (setup) => recording(createFill(setup), id, setup, recorded),
    });
    for (const outcome of outcomes) ms.push(...outcome.adviseMs);
  }
  printAdvice(ms);
  const longest = recorded.reduce((a, b) => (b.seconds > a.seconds ? b : a));
  printReplay(longest, (setup) => createFill(setup));
}

function recording(fill: Fill, id: number, setup: FillSetup, into: Recorded[]): Fill {
  const own: Recorded = {
    coach: drawCoach(id),
    tire: into.length % 4,
    setup,
    events: [],
    seconds: 0,
  };
  into.push(own);
  return {
    apply: (event) => {
      own.events.push(event);
      fill.apply(event);
    },
    advise: (at) => {
      own.seconds = at;
      return fill.advise(at);
    },
    profile: (): AirProfile => fill.profile(),
    supplyAt: (at) => fill.supplyAt(at),
  };
}

function printAdvice(ms: number[]): void {
  const [half, most, nearly] = [0.5, 0.9, 0.99].map((share) => quantile(ms, share).toFixed(2));
  console.log(`advise, ${ms.length} calls: median ${half}, p90 ${most}, p99 ${nearly} ms (goal 4)`);
}

function printReplay(fill: Recorded, createFill: (setup: FillSetup) => Fill): void {
  const engine = best(() => {
    const replayed = createFill(fill.setup);
    for (const event of fill.events) replayed.apply(event);
    replayed.advise(fill.seconds);
  });
  const byOdex = best(() => integrateByOdex(fill));
  const byMathjs = best(() => integrateByMathjs(fill));
  const name = `${fill.seconds.toFixed(0)} s with ${fill.events.length} events`;
  console.log(`one fill of ${name}, whole ensemble, replayed: ${engine.toFixed(1)} ms`);
  console.log(
    `the same by odex, one coach: ${byOdex.toFixed(2)} ms, ratio ${(engine / byOdex).toFixed(1)}`,
  );
  console.log(
    `by mathjs, one coach: ${byMathjs.toFixed(2)} ms, ratio ${(engine / byMathjs).toFixed(1)}`,
  );
}

function best(run: () => void): number {
  let least = Number.POSITIVE_INFINITY;
  for (let i = 0; i < REPEATS; i++) {
    const clock = startClock();
    run();
    least = Math.min(least, readClock(clock));
  }
  return least;
}

/** Supply that rises under a loaded compressor while it fills the tire: absolute kPa, both. */
function slopes({ coach, tire }: Recorded): (supply: number, inside: number) => [number, number] {
  const plan = coach.tires[tire]!;
  const c = inSeries(coach.hoseToGaugeC, chuckSideC(coach, plan));
  const tanksL = coach.supplyL + coach.serviceL;
  return (supply, inside) => {
    const flow = flowThrough(supply, inside, c, coach.criticalRatio);
    return [(100 * coach.fastDelivery - flow) / tanksL, flow / plan.volumeL];
  };
}

function startOf({ coach, tire }: Recorded): [number, number] {
  const { startKpa } = coach.tires[tire]!;
  return [coach.cutInKpa + coach.atmosphereKpa, startKpa + coach.atmosphereKpa];
}

function integrateByOdex(fill: Recorded): number[] {
  const slope = slopes(fill);
  const solver = new Solver(2);
  solver.relativeTolerance = TOLERANCE;
  solver.absoluteTolerance = TOLERANCE;
  const f = (_t: number, [supply, inside]: number[]) => slope(supply!, inside!);
  return solver.solve(f, 0, startOf(fill), fill.seconds).y;
}

/** The library's own types leave this function out. */
const { solveODE } = mathjs as unknown as {
  solveODE(
    f: (t: number, y: number[]) => number[],
    span: number[],
    y0: number[],
    options: { tol: number },
  ): { y: number[][] };
};

function integrateByMathjs(fill: Recorded): number[] {
  const slope = slopes(fill);
  const f = (_t: number, y: number[]) => slope(y[0]!, y[1]!);
  const { y } = solveODE(f, [0, fill.seconds], startOf(fill), { tol: TOLERANCE });
  return y[y.length - 1]!;
}
