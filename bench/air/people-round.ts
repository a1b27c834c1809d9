import { type Coach, drawCoach } from './coach';
import type { FillOutcome } from './outcome';
import { playPerfect } from './perfect';
import type { PersonTraits } from './person-traits';
import { between, diceFor } from './random';
import { fillByEye, outcomeByEye, startMemory } from './tee-person';
import { activeTire, copyWorld, STEP_S, startWorld, stepWorld, type World } from './world';

/** Walk to the next tire with hose and chuck, s. */
export const BETWEEN_TIRES_S: [number, number] = [25, 60];
/** Nobody, perfect or not, stays longer than this at a tire that cannot be reached, s. */
const HOPELESS_S = 10;

export function walkOn(world: World, seconds: number): void {
  for (let i = 0; i < Math.round(seconds / STEP_S); i++) stepWorld(world);
}

/** The perfect player's seconds from here; unreachable tires are not worth the search. */
export function perfectFrom(world: World) {
  return playPerfect(copyWorld(world), activeTire(world).reachable ? undefined : HOPELESS_S);
}

/** One person without the product fills the four tires of one coach. */
export function roundByEye(id: number, traits: PersonTraits, stream: number): FillOutcome[] {
  const coach: Coach = drawCoach(id);
  const world = startWorld(coach, 0);
  const dice = diceFor(id, 3, stream);
  const memory = startMemory(traits, dice);
  const outcomes: FillOutcome[] = [];
  for (const index of coach.tires.keys()) {
    world.active = index;
    walkOn(world, between(dice, ...BETWEEN_TIRES_S));
    if (!activeTire(world).reachable) continue;
    const { seconds } = perfectFrom(world);
    outcomes.push(
      outcomeByEye(world, index, seconds, () => fillByEye(world, traits, memory, dice)),
    );
  }
  return outcomes;
}
