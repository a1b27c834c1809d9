import { type Axle, axleOf, pressureAtTemperature, type WheelPosition, walkOrderOf } from '~/loads';
import {
  type AbsoluteKpa,
  celsius,
  type GaugeKpa,
  gaugeKpa,
  kpaPerPsi,
  metres,
  psi,
  psiToKpa,
  seaLevelKpa,
  standardAtmosphere,
  toAbsolute,
  toGauge,
} from '~/units';
import { type DemoCoach, demoDays, demoPlaces } from './demo-coaches';

/** One round of the story, before any fill: what the gauge showed on every tire. */
export interface StoryRound {
  at: Date;
  place: (typeof demoPlaces)[number];
  ambientC: number;
  atmosphere: AbsoluteKpa;
  readings: { position: WheelPosition; kpa: GaugeKpa; targetKpa: GaugeKpa }[];
}

const day = 86_400_000;
/** No round of the story is younger than two days. */
const storyDays = demoDays - 2;
const daysAMonth = 30.4;

/** The temperature at which the story keeps what each tire holds. */
const keptAt = celsius(20);

/** A walking generator of the story's small irregularities; seeded, so each demo is the same. */
export function storyNoise(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

export const targetOf = (coach: DemoCoach, axle: Axle): GaugeKpa =>
  psiToKpa(psi(coach.targetPsi[axle] ?? coach.targetPsi.drive));

/**
 * The half year of one coach. `fill` is called for the tires that need air and answers with the
 * pressure that they were left at, which the next round starts from.
 */
export async function* tellStory(
  coach: DemoCoach,
  now: Date,
  fill: (round: StoryRound, position: WheelPosition, from: GaugeKpa) => Promise<GaugeKpa>,
): AsyncGenerator<StoryRound> {
  const noise = storyNoise(coach.seed);
  const held = firstPressures(coach, noise);
  const start = now.getTime() - demoDays * day;
  for (let passed = 0; passed < storyDays; passed += coach.everyDays) {
    const round = readRound(coach, start + passed * day, passed, held, noise);
    yield round;
    for (const reading of round.readings) {
      let kpa = reading.kpa;
      const last = passed + coach.everyDays >= storyDays;
      const left = last && reading.position === coach.left;
      if (needsAir(reading) && !left) kpa = await fill(round, reading.position, kpa);
      held.set(reading.position, keep(kpa, round));
    }
    lose(coach, held);
  }
}

/** As the cold check sorts: what is two psi low, to the reading's own rounding, still holds. */
const needsAir = ({ targetKpa, kpa }: StoryRound['readings'][number]) =>
  targetKpa - kpa > 2.01 * kpaPerPsi;

function firstPressures(coach: DemoCoach, noise: () => number): Map<WheelPosition, GaugeKpa> {
  return new Map(
    walkOrderOf(coach.layout).map((position) => [
      position,
      gaugeKpa(targetOf(coach, axleOf(position)) + (noise() - 0.4) * 2 * kpaPerPsi),
    ]),
  );
}

function readRound(
  coach: DemoCoach,
  at: number,
  passed: number,
  held: Map<WheelPosition, GaugeKpa>,
  noise: () => number,
): StoryRound {
  const place = demoPlaces[Math.floor(noise() * demoPlaces.length)] ?? demoPlaces[0];
  // Half a year from summer to winter, or back: the mornings go from one end to the other.
  const season = 0.5 + 0.5 * Math.cos((passed / demoDays) * Math.PI);
  const ambientC = Math.round(place.coldestC + season * (place.warmestC - place.coldestC));
  const atmosphere = standardAtmosphere(metres(place.altitudeM));
  const morning = new Date(at);
  morning.setUTCHours(14, Math.floor(noise() * 50), 0, 0);
  const round: StoryRound = { at: morning, place, ambientC, atmosphere, readings: [] };
  for (const [position, kept] of held) {
    const shown = pressureAtTemperature(
      shift(kept, seaLevelKpa, atmosphere),
      keptAt,
      celsius(ambientC),
      atmosphere,
    );
    const halfPsi = Math.round((shown / kpaPerPsi) * 2) / 2;
    round.readings.push({
      position,
      kpa: psiToKpa(psi(halfPsi)),
      targetKpa: targetOf(coach, axleOf(position)),
    });
  }
  return round;
}

/** The same air under another atmosphere shows another gauge pressure. */
const shift = (gauge: GaugeKpa, from: AbsoluteKpa, to: AbsoluteKpa): GaugeKpa =>
  toGauge(toAbsolute(gauge, from), to);

function keep(kpa: GaugeKpa, round: StoryRound): GaugeKpa {
  const warm = pressureAtTemperature(kpa, celsius(round.ambientC), keptAt, round.atmosphere);
  return shift(warm, round.atmosphere, seaLevelKpa);
}

function lose(coach: DemoCoach, held: Map<WheelPosition, GaugeKpa>): void {
  for (const [position, kpa] of held) {
    const monthly = coach.loss[position] ?? coach.usualLoss;
    held.set(position, gaugeKpa(kpa - (monthly * coach.everyDays * kpaPerPsi) / daysAMonth));
  }
}
