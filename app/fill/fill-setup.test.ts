import { describe, expect, it } from 'vitest';
import { createFill } from '~/air';
import { metres, standardAtmosphere } from '~/units';
import { type CoachBasis, composeFillSetup, type NextFill } from './fill-setup';
import type { LogEntry } from './log';
import type { RunState } from './store';
import type { WireEvent } from './wire-events';
import { wireSetup } from './wire-setup';

const wheel = {
  tireId: 't',
  position: 'steer-left',
  size: '295/75R22.5',
  targetKpa: 758,
  limitKpa: 827,
  volumeL: 140,
} as const;
const coach: CoachBasis = {
  id: 'c',
  name: 'Anna’s coach',
  layout: 'two-axles',
  toleranceKpa: 7,
  lowerBy: ['drain'],
  rig: {
    hose: 'grey',
    chuck: 'clip',
    gauge: 'tee',
    gaugePlace: 'above-valve',
    hasValve: true,
    stepKpa: 6.9,
  },
  wheels: [wheel],
  profile: null,
};
const epoch = Date.UTC(2026, 4, 4, 9);
const next = (change: Partial<NextFill> = {}): NextFill => ({
  coach,
  round: { altitudeM: 1500, withHelper: true },
  wheel,
  startKpa: 700,
  warm: false,
  now: epoch + 300_000,
  seed: 5,
  ...change,
});

const tapAt = (atMs: number, own: object): LogEntry => ({
  event: { id: `e${atMs}`, atMs, ...own } as unknown as WireEvent,
  deviceId: 'phone',
  side: 'wheel',
  seq: null,
});

/** The fill of the tire before: 100 s, with a purge heard. */
const earlier = (change: Partial<RunState> = {}): RunState => ({
  id: 'r',
  kind: 'fill',
  roundId: 'round',
  coachId: 'c',
  tireId: 't0',
  position: 'steer-right',
  startedAt: new Date(epoch).toISOString(),
  setup: composeFillSetup(next()),
  engineVersion: '1',
  deviceId: 'phone',
  mayEnd: true,
  log: [
    tapAt(5000, { type: 'engine', speed: 'fast-idle' }),
    tapAt(40_000, { type: 'cut-out' }),
    tapAt(100_000, { type: 'ended', how: 'done' }),
  ],
  ...change,
});

describe('what a fill starts from', () => {
  it('comes from tire, coach, rig and round', () => {
    expect(composeFillSetup(next())).toEqual({
      tire: {
        startKpa: 700,
        targetKpa: 758,
        // Half of the coach's.
        toleranceKpa: 3.5,
        volumeL: 140,
        limitKpa: 827,
        warm: false,
      },
      rig: {
        gauge: 'above-valve',
        valve: true,
        stepKpa: 6.9,
        hose: 'grey',
        chuck: 'clip',
        gaugeName: 'tee',
      },
      lowerBy: ['drain'],
      crew: { helper: true },
      atmosphereKpa: standardAtmosphere(metres(1500)),
      seed: 5,
    });
  });

  it('goes over the wire as it is, and the engine starts from it', () => {
    for (const setup of [
      composeFillSetup(next()),
      composeFillSetup(next({ earlier: earlier() })),
    ]) {
      expect(wireSetup.parse(setup)).toEqual(setup);
      expect(JSON.parse(JSON.stringify(setup))).toEqual(setup);
      expect(createFill(setup).advise(0).call).toMatch(/^[a-z-]+$/);
    }
  });

  it('takes the supply of the fill before, run on until now, and what it learned', () => {
    const { supply, profile } = composeFillSetup(next({ earlier: earlier() }));
    const replayed = createFill(earlier().setup);
    replayed.apply({ type: 'engine', speed: 'fast-idle', at: 5, id: 'e5000' });
    replayed.apply({ type: 'cut-out', at: 40, id: 'e40000' });
    expect(supply).toEqual(JSON.parse(JSON.stringify(replayed.supplyAt(300))));
    expect(profile).toEqual(JSON.parse(JSON.stringify(replayed.profile())));
  });

  it('takes the coach’s kept profile when there is no fill before', () => {
    const profile = createFill(composeFillSetup(next())).profile();
    const setup = composeFillSetup(next({ coach: { ...coach, profile } }));
    expect(setup.profile).toEqual(JSON.parse(JSON.stringify(profile)));
    expect(setup.supply).toBeUndefined();
  });

  it('takes nothing over from long ago, from tomorrow, or from another hose', () => {
    const startedAt = (ms: number) => earlier({ startedAt: new Date(epoch + ms).toISOString() });
    const otherHose = earlier();
    const rig = { ...otherHose.setup.rig!, hose: 'red' };
    for (const before of [
      startedAt(-31 * 60_000 + 200_000),
      startedAt(-2 * 86_400_000),
      startedAt(400_000),
      { ...otherHose, setup: { ...otherHose.setup, rig } },
    ]) {
      const { supply, profile } = composeFillSetup(next({ earlier: before }));
      expect([supply, profile]).toEqual([undefined, undefined]);
    }
  });

  it('asks nothing of a rig that has not been described', () => {
    const setup = composeFillSetup(next({ coach: { ...coach, rig: null, lowerBy: [] } }));
    expect(setup.rig).toBeUndefined();
    expect(setup.lowerBy).toEqual([]);
  });
});
