import { type AirProfile, createFill, type FillSetup } from '~/air';
import type { AxleLayout, WheelPosition } from '~/loads';
import { metres, standardAtmosphere } from '~/units';
import { endOf, fillEventsOf } from './log';
import { rigKeyOf } from './rig-key';
import type { RoundState, RunState } from './store';
import { longestRunMs } from './wire-fields';

/** A tire where it sits, with what bounds its filling. Gauge kPa, litres. */
export interface Wheel {
  readonly tireId: string;
  readonly position: WheelPosition;
  readonly size: string;
  readonly targetKpa: number;
  /** The lower one of sidewall and wheel. */
  readonly limitKpa: number;
  readonly volumeL: number;
}

export interface RigInUse {
  readonly hose: string;
  readonly chuck: string;
  readonly gauge: string;
  readonly gaugePlace: 'at-chuck' | 'above-valve' | 'below-valve' | 'dash-only';
  readonly hasValve: boolean;
  readonly stepKpa: number;
}

/** What of a coach a round and its fills are made from. */
export interface CoachBasis {
  readonly id: string;
  readonly name: string;
  readonly layout: AxleLayout;
  readonly toleranceKpa: number;
  readonly lowerBy: readonly ('pedal' | 'drain')[];
  readonly rig: RigInUse | null;
  readonly wheels: readonly Wheel[];
  /** The newest that was learned with this rig. */
  readonly profile: AirProfile | null;
}

export interface NextFill {
  readonly coach: CoachBasis;
  readonly round: Pick<RoundState, 'altitudeM' | 'withHelper'>;
  readonly wheel: Wheel;
  /** What the tire held when it was read, gauge kPa. */
  readonly startKpa: number;
  readonly warm: boolean;
  /** The fill before in the same round. */
  readonly earlier?: RunState | undefined;
  /** Milliseconds since the epoch, by the server's clock as the phone knows it. */
  readonly now: number;
  /** 0 to 4294967295. */
  readonly seed: number;
}

/**
 * A fill ends closer to its target than the cold check asks: else it could end where the next cool
 * morning calls for air again (our choice).
 */
const fillShareOfTolerance = 0.5;

/**
 * What the engine starts from, for the next tire of a round. The fill before hands on the state of
 * the supply and what it has learned; else the coach's kept profile is the prior.
 * It passes through JSON once, so that this phone starts from the very bits that are stored.
 */
export function composeFillSetup(next: NextFill): FillSetup {
  const { coach, round, wheel, startKpa, warm, seed } = next;
  const rig = coach.rig ? rigOf(coach.rig) : undefined;
  const setup: FillSetup = {
    tire: {
      startKpa,
      targetKpa: wheel.targetKpa,
      toleranceKpa: coach.toleranceKpa * fillShareOfTolerance,
      volumeL: wheel.volumeL,
      limitKpa: wheel.limitKpa,
      warm,
    },
    rig,
    lowerBy: [...coach.lowerBy],
    crew: { helper: round.withHelper },
    atmosphereKpa: standardAtmosphere(metres(round.altitudeM)),
    profile: coach.profile ?? undefined,
    ...handedOn(next.earlier, next.now, rigKeyOf({ rig })),
    seed,
  };
  return JSON.parse(JSON.stringify(setup)) as FillSetup;
}

function rigOf(rig: RigInUse): NonNullable<FillSetup['rig']> {
  const { gaugePlace, hasValve, stepKpa, hose, chuck, gauge } = rig;
  return { gauge: gaugePlace, valve: hasValve, stepKpa, hose, chuck, gaugeName: gauge };
}

/** After this long the tanks have leaked, been driven or been drained: nothing is known of them. */
const supplyKeepsMs = 30 * 60_000;

/** The end of a fill replayed: its supply, run on until now, and its profile. */
function handedOn(
  earlier: RunState | undefined,
  now: number,
  rigKey: string,
): Pick<FillSetup, 'supply' | 'profile'> {
  if (!earlier || rigKeyOf(earlier.setup) !== rigKey) return {};
  const sinceStart = now - Date.parse(earlier.startedAt);
  const sinceEnd = sinceStart - (endOf(earlier.log)?.atMs ?? sinceStart);
  if (sinceEnd > supplyKeepsMs || sinceStart > longestRunMs || sinceStart < 0) return {};
  const fill = createFill(earlier.setup);
  for (const event of fillEventsOf(earlier.log)) fill.apply(event);
  return { supply: fill.supplyAt(sinceStart / 1000), profile: fill.profile() };
}
