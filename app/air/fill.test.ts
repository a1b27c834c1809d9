import { describe, expect, it } from 'vitest';
import type { FillEvent, FillSetup } from './index';
import { createFill, createPracticeCoach, REASONS } from './index';
import { KPA_PER_PSI } from './priors';

const psi = (value: number) => value * KPA_PER_PSI;

function setupOf(tire: Partial<FillSetup['tire']> = {}, more: Partial<FillSetup> = {}): FillSetup {
  return {
    tire: {
      startKpa: psi(100),
      targetKpa: psi(106),
      toleranceKpa: psi(1),
      volumeL: 150,
      ...tire,
    },
    lowerBy: ['pedal'],
    crew: { helper: true },
    ...more,
  };
}

function adviceAfter(setup: FillSetup, events: FillEvent[], at: number) {
  const fill = createFill(setup);
  for (const event of events) fill.apply(event);
  return fill.advise(at);
}

describe('a start', () => {
  it('within tolerance is done', () => {
    expect(createFill(setupOf({ startKpa: psi(105.5) })).advise(0).call).toBe('done');
  });

  it('above it and cold is bled', () => {
    expect(createFill(setupOf({ startKpa: psi(110) })).advise(0).call).toBe('bleed');
  });

  it('above it and warm is left alone, with the reason', () => {
    const advice = createFill(setupOf({ startKpa: psi(110), warm: true })).advise(0);
    expect(advice).toMatchObject({ call: 'done', reason: 'warm-over-target' });
  });

  it('below it asks for a reading first, since nothing is known', () => {
    const advice = createFill(setupOf()).advise(0);
    expect(advice).toMatchObject({ call: 'read-supply', readIn: 0, cab: 'set-fast-idle' });
  });

  it('without an engine event leaves the speed unknown', () => {
    const { loaded } = createFill(setupOf()).advise(0);
    expect(loaded).toBeGreaterThan(0.1);
    expect(loaded).toBeLessThan(0.95);
  });
});

describe('bad input is refused by field and value', () => {
  const setups: [string, FillSetup][] = [
    ['tire.startKpa', setupOf({ startKpa: Number.NaN })],
    ['tire.startKpa', setupOf({ startKpa: -1 })],
    ['tire.targetKpa', setupOf({ targetKpa: 1401 })],
    ['tire.toleranceKpa', setupOf({ toleranceKpa: 0 })],
    ['tire.volumeL', setupOf({ volumeL: 0 })],
    ['tire.limitKpa', setupOf({ limitKpa: -5 })],
    ['tire.targetKpa', setupOf({ limitKpa: psi(100) })],
    ['atmosphereKpa', setupOf({}, { atmosphereKpa: 0 })],
  ];
  it.each(setups)('set-up: %s', (field, setup) => {
    expect(() => createFill(setup)).toThrow(RangeError);
    expect(() => createFill(setup)).toThrow(field);
  });

  const events: [string, FillEvent][] = [
    ['at is -1', { type: 'cut-out', at: -1 }],
    ['at is 86401', { type: 'cut-out', at: 86401 }],
    ['at is NaN', { type: 'cut-out', at: Number.NaN }],
    ['kpa is 1401', { type: 'tire-reading', at: 1, kpa: 1401 }],
    ['kpa is -3', { type: 'supply-reading', source: 'wheel-gauge', at: 1, kpa: -3 }],
    ['stepKpa is 0', { type: 'tire-reading', at: 1, kpa: 700, stepKpa: 0 }],
  ];
  it.each(events)('event: %s', (text, event) => {
    const fill = createFill(setupOf());
    expect(() => fill.apply(event)).toThrow(RangeError);
    expect(() => fill.apply(event)).toThrow(text);
  });

  it('advice: a negative time', () => {
    expect(() => createFill(setupOf()).advise(-0.1)).toThrow('at is -0.1');
  });
});

describe('a fill on a simulated coach', { timeout: 90_000 }, () => {
  it('ends within tolerance, gauged, by following the calls', () => {
    const coach = createPracticeCoach({
      seed: 4,
      tire: { startKpa: psi(98), volumeL: 140 },
      engine: 'fast-idle',
      supplyKpa: psi(110),
      wheelGauge: { biasKpa: 4, stepKpa: psi(1) },
    });
    const fill = createFill(setupOf({ startKpa: psi(98), volumeL: 140, limitKpa: psi(115) }));
    const reasons = new Set<string>();
    let call = '';
    let nextAct = 0;
    fill.apply({ type: 'engine', speed: 'fast-idle', at: 0 });
    for (let at = 0; at < 900 && call !== 'done'; at += 1) {
      for (const notice of coach.advance(1)) {
        if (notice.type === 'cut-out') fill.apply({ type: 'cut-out', at: at + 1 });
      }
      const advice = fill.advise(at + 1);
      call = advice.call;
      reasons.add(advice.reason);
      if (at < nextAct) continue;
      nextAct = at + 2;
      act(call, at + 1);
    }
    function act(what: string, at: number): void {
      if (what === 'chuck-on' || what === 'chuck-off') {
        coach.setChuck(what === 'chuck-on');
        fill.apply({ type: 'chuck', on: what === 'chuck-on', at });
      } else if (what === 'lower-supply' || what === 'stop-lowering') {
        const on = what === 'lower-supply';
        coach.setLowering('pedal', on);
        fill.apply({ type: 'lowering', by: 'pedal', on, at });
      } else if (what === 'gauge-tire') {
        fill.apply({ type: 'tire-reading', kpa: coach.tireKpa(), at });
        nextAct = at + 6;
      } else if (what === 'read-supply' || (fill.advise(at).readIn ?? 1) <= 0) {
        const kpa = coach.wheelGaugeKpa();
        fill.apply({ type: 'supply-reading', source: 'wheel-gauge', kpa, at });
      }
    }
    expect(call).toBe('done');
    expect(Math.abs(coach.settledKpa() - psi(106))).toBeLessThan(psi(1.3));
    for (const reason of reasons) expect(REASONS).toContain(reason);
  });
});

describe('limits', () => {
  it('the chuck is called off before the tire may pass its limit', () => {
    const setup = setupOf({ targetKpa: psi(106), limitKpa: psi(106) });
    const events: FillEvent[] = [
      { type: 'engine', speed: 'fast-idle', at: 0 },
      { type: 'supply-reading', source: 'wheel-gauge', kpa: psi(118), at: 2 },
      { type: 'chuck', on: true, at: 5 },
    ];
    const fill = createFill(setup);
    for (const event of events) fill.apply(event);
    for (let at = 5; at < 300; at += 1) {
      const { call, tireKpa } = fill.advise(at);
      if (call !== 'keep-on') break;
      expect(tireKpa.p90).toBeLessThanOrEqual(psi(106));
    }
  });

  it('never asks to lower while the compressor is loaded or the chuck is on', () => {
    const events: FillEvent[] = [
      { type: 'engine', speed: 'fast-idle', at: 0 },
      { type: 'supply-reading', source: 'wheel-gauge', kpa: psi(98), at: 2 },
      { type: 'cut-in', at: 3 },
      { type: 'supply-reading', source: 'wheel-gauge', kpa: psi(102), at: 9 },
    ];
    for (let at = 3; at < 40; at += 2) {
      expect(adviceAfter(setupOf(), events.slice(0, at < 9 ? 3 : 4), at).call).not.toBe(
        'lower-supply',
      );
    }
  });
});

describe('done and proof', () => {
  const hold: FillEvent[] = [
    { type: 'supply-reading', source: 'wheel-gauge', kpa: psi(116), at: 2 },
    { type: 'chuck', on: true, at: 5 },
    { type: 'chuck', on: false, at: 35 },
  ];

  it('is not done before the tire is gauged', () => {
    expect(adviceAfter(setupOf(), hold, 40).call).not.toBe('done');
  });

  it('is done when gauged within tolerance', () => {
    const gauged: FillEvent[] = [...hold, { type: 'tire-reading', kpa: psi(106), at: 45 }];
    expect(adviceAfter(setupOf(), gauged, 46)).toMatchObject({ call: 'done' });
  });

  it('bleeds when gauged over, and asks to gauge when enough is let out', () => {
    const gauged: FillEvent[] = [...hold, { type: 'tire-reading', kpa: psi(109), at: 45 }];
    expect(adviceAfter(setupOf(), gauged, 46).call).toBe('bleed');
    const bled: FillEvent[] = [...gauged, { type: 'bleeding', on: true, at: 50 }];
    let asked = -1;
    for (let at = 50; at < 110 && asked < 0; at += 1) {
      if (adviceAfter(setupOf(), bled, at).call === 'gauge-tire') asked = at;
    }
    expect(asked).toBeGreaterThan(50);
  });

  it('takes a mistyped ten for odd and is set right by the next reading', () => {
    const fill = createFill(setupOf());
    for (const event of hold) fill.apply(event);
    fill.apply({ type: 'tire-reading', kpa: psi(96), at: 45, id: 'wrong' });
    fill.apply({ type: 'tire-reading', kpa: psi(105.5), at: 60 });
    const { tireKpa } = fill.advise(61);
    expect(Math.abs(tireKpa.p50 - psi(105.5))).toBeLessThan(psi(1));
  });
});
