import { describe, expect, it } from 'vitest';
import { drawCoach } from './coach';
import { psi } from './flow';
import { playPerfect, playPolicy } from './perfect';
import { pressureAbs } from './vessel';
import {
  activeTire,
  copyWorld,
  fittingKpa,
  settledKpa,
  startWorld,
  stepWorld,
  type World,
} from './world';

const COACHES = Array.from({ length: 12 }, (_, i) => drawCoach(i));

function allAir(world: World): number {
  const vessels = [world.supply, world.service, world.accessory, ...world.tires];
  return vessels.reduce((sum, vessel) => sum + vessel.amount, 0);
}

function run(world: World, seconds: number, each: (world: World) => void = () => {}): void {
  for (let i = 0; i < seconds * 10; i++) {
    stepWorld(world);
    each(world);
  }
}

describe('the world of the air bench', () => {
  it.each(COACHES)(
    'keeps its air: what came in less what went out is there (coach $id)',
    (coach) => {
      const world = startWorld(coach, 0);
      world.speed = 'fast-idle';
      const before = allAir(world);
      world.chuck = coach.id % 3 === 0 ? 'leaking' : 'open';
      world.pedal = coach.id % 2 === 0;
      world.bleeding = coach.id % 5 === 0;
      run(world, 200);
      const after = before + world.taken - world.given;
      expect(Math.abs(allAir(world) - after)).toBeLessThan(1e-6 * after);
    },
  );

  it.each(COACHES)('cycles between cut-in and cut-out (coach $id)', (coach) => {
    const world = startWorld(coach, 0);
    world.speed = 'fast-idle';
    const slack = 5 * coach.governorJitterKpa + psi(1) + coach.purgeDropKpa;
    // One push takes its air from tank and supply together before the governor answers.
    const push = coach.brakeKpa;
    run(world, 600, (w) => {
      w.pedal = !w.loaded;
      const kpa = pressureAbs(w.supply) - coach.atmosphereKpa;
      if (w.cutIns === 0) return;
      expect(kpa).toBeLessThan(coach.cutOutKpa + slack);
      expect(kpa).toBeGreaterThan(coach.cutInKpa - slack - push);
    });
    expect(world.cutIns).toBeGreaterThan(0);
  });

  it('never moves air uphill into or out of a tire', () => {
    for (const coach of COACHES) {
      const world = startWorld(coach, 0);
      world.chuck = 'open';
      run(world, 120, (w) => {
        const drop = fittingKpa(w) - (pressureAbs(w.tires[0]!) - coach.atmosphereKpa);
        // After the step, levelled vessels may have crossed by what warmth adds.
        if (Math.abs(drop) > 1) expect(Math.sign(w.tireFlow)).toBe(Math.sign(drop));
      });
    }
  });

  it('gives the same run for the same coach and round, also from a copy', () => {
    const first = startWorld(drawCoach(7), 1);
    const second = startWorld(drawCoach(7), 1);
    run(first, 50);
    run(second, 50);
    const copy = copyWorld(second);
    run(first, 300);
    run(copy, 300);
    expect(copy).toEqual(first);
  });
});

describe('the perfect player', () => {
  it.each(COACHES.slice(0, 6))(
    'ends each reachable tire at its target, not bled (coach $id)',
    (coach) => {
      const world = startWorld(coach, 0);
      world.speed = 'fast-idle';
      for (const index of coach.tires.keys()) {
        world.active = index;
        if (!activeTire(world).reachable) continue;
        const best = playPerfect(world);
        const replay = copyWorld(world);
        expect(best.seconds).toBeLessThan(3600);
        expect(playPolicy(replay, best.policy, 3600)).toBe(best.seconds);
        const error = settledKpa(replay) - activeTire(replay).targetKpa;
        expect(Math.abs(error)).toBeLessThan(psi(0.3));
        expect(replay.bleeding).toBe(false);
      }
    },
  );

  it('never ends a tire that the governor cannot reach', () => {
    const beyond = Array.from({ length: 60 }, (_, i) => drawCoach(i)).filter((coach) =>
      coach.tires.some((tire) => !tire.reachable),
    );
    expect(beyond.length).toBeGreaterThan(0);
    for (const coach of beyond.slice(0, 2)) {
      const world = startWorld(coach, 0);
      world.active = coach.tires.findIndex((tire) => !tire.reachable);
      expect(playPerfect(world, 300).seconds).toBe(Number.POSITIVE_INFINITY);
    }
  });
});
