import { describe, expect, it } from 'vitest';
import type { Advice, FillEvent, FillSetup } from './index';
import { createFill } from './index';
import { KPA_PER_PSI } from './priors';

const psi = (value: number) => value * KPA_PER_PSI;

const SETUP: FillSetup = {
  tire: { startKpa: psi(100), targetKpa: psi(106), toleranceKpa: psi(1), volumeL: 150 },
  lowerBy: ['pedal'],
  crew: { helper: true },
};

const reading = (
  at: number,
  value: number,
  source: 'wheel-gauge' | 'dash-gauge' = 'wheel-gauge',
): FillEvent => ({ type: 'supply-reading', source, kpa: psi(value), at });
const idle: FillEvent = { type: 'engine', speed: 'fast-idle', at: 0 };

/** Every reason that a check gave between two times. */
function checked(events: FillEvent[], from: number, until: number): string[] {
  const fill = createFill(SETUP);
  for (const event of events) fill.apply(event);
  const said: Advice[] = [];
  for (let at = from; at <= until; at += 3) said.push(fill.advise(at));
  return said.filter((advice) => advice.call === 'check').map((advice) => advice.reason);
}

describe('every check is said within 90 s of its evidence', () => {
  it('the supply does not move', () => {
    const events: FillEvent[] = [
      idle,
      reading(2, 110),
      { type: 'lowering', by: 'pedal', on: true, at: 6 },
      reading(20, 110),
      reading(32, 110),
    ];
    expect(checked(events, 20, 95)).toContain('supply-not-moving');
  });

  it('the compressor does not load below cut-in', () => {
    const events = [idle, reading(2, 78), reading(20, 77), reading(38, 76), reading(56, 75)];
    expect(checked(events, 20, 90)).toContain('compressor-not-loading');
  });

  it('it does not build', () => {
    const events: FillEvent[] = [
      idle,
      reading(2, 88),
      { type: 'cut-in', at: 4 },
      reading(20, 88),
      reading(40, 89),
      reading(60, 89),
    ];
    expect(checked(events, 20, 90)).toContain('not-building');
  });

  it('the gauges disagree', () => {
    const events = [idle, reading(2, 118), reading(8, 92, 'dash-gauge')];
    expect(checked(events, 8, 90)).toContain('gauges-disagree');
  });

  it('the tire does not rise though the chuck is on', () => {
    const events: FillEvent[] = [
      idle,
      reading(2, 117),
      { type: 'chuck', on: true, at: 5 },
      { type: 'chuck', on: false, at: 40 },
      { type: 'tire-reading', kpa: psi(100), at: 48 },
    ];
    expect(checked(events, 48, 130)).toContain('tire-not-rising');
  });

  it('is the chuck still on', () => {
    const events: FillEvent[] = [
      idle,
      reading(2, 117),
      { type: 'chuck', on: true, at: 5 },
      { type: 'call-shown', call: 'chuck-off', at: 30 },
    ];
    expect(checked(events, 30, 120)).toContain('chuck-still-on');
  });

  it('low air', () => {
    const events: FillEvent[] = [idle, reading(2, 62), { type: 'low-air', on: true, at: 4 }];
    expect(checked(events, 4, 90)).toContain('low-air');
  });
});

it('a healthy supply gives no check', () => {
  const events = [idle, reading(2, 92), reading(20, 101), reading(38, 109), reading(56, 116)];
  expect(checked(events, 2, 60)).toEqual([]);
});
