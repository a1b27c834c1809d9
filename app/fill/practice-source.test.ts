import { expect, test } from 'vitest';
import { createFill } from '~/air';
import { LiveReader } from './live-driver';
import { createPracticeSource } from './practice-source';
import { practiceSituations, practiceStart } from './practice-starts';

function practise(key: string) {
  const situation = practiceSituations.find((each) => each.key === key);
  if (!situation) throw new Error(`no situation ${key}`);
  let clock = 100;
  const start = practiceStart(situation, 1, 'psi');
  const source = createPracticeSource(start, () => clock, new Date(2026, 5, 1, 10, 0, 0));
  return { source, pass: (seconds: number) => (clock += seconds) };
}

/** Does what the calls say, a second at a time, reading the gauges that the coach shows. */
function obeyCalls(key: string, seconds: number) {
  const { source, pass } = practise(key);
  const reader = new LiveReader(createFill(source.setup));
  for (let second = 0; second < seconds && !source.ended(); second++) {
    pass(1);
    const at = source.now();
    reader.read(source.events());
    const { call, cab, by } = reader.advise(at);
    const shows = source.readOuts();
    if (cab === 'set-fast-idle' && !source.events().some((event) => event.type === 'engine')) {
      source.tap({ type: 'engine', speed: 'fast-idle' }, at);
    } else if (call === 'read-supply') {
      source.tap({ type: 'supply-reading', source: 'wheel-gauge', kpa: shows.hoseKpa }, at);
    } else if (call === 'chuck-on' || call === 'chuck-off') {
      source.tap({ type: 'chuck', on: call === 'chuck-on' }, at);
    } else if (call === 'lower-supply' || call === 'stop-lowering') {
      source.tap({ type: 'lowering', by: by ?? 'pedal', on: call === 'lower-supply' }, at);
    } else if (call === 'gauge-tire' && shows.tireKpa !== undefined) {
      source.tap({ type: 'tire-reading', kpa: shows.tireKpa }, at);
    } else if (call === 'done' || call === 'cannot-reach') {
      source.end();
    }
  }
  return source;
}

test('following the calls ends a steer tire within tolerance, with air put in', () => {
  const source = obeyCalls('steer', 900);
  const result = source.result();
  expect(source.ended()).toBe(true);
  expect(result.withinTolerance).toBe(true);
  expect(result.timesOn).toBeGreaterThan(0);
  expect(result.settledKpa).toBeGreaterThan(source.setup.tire.startKpa);
});

test('putting it on below the tire loses air, and the result says how much', () => {
  const { source, pass } = practise('headroom');
  source.tap({ type: 'chuck', on: true }, 0);
  for (let second = 0; second < 20; second++) {
    pass(1);
    source.now();
  }
  source.end();
  const { lostKpa, withinTolerance, settledKpa } = source.result();
  expect(lostKpa).toBeGreaterThan(1);
  expect(settledKpa).toBeCloseTo(source.setup.tire.startKpa - lostKpa, 3);
  expect(withinTolerance).toBe(false);
});

test('a chuck-on that is taken back comes off the simulated tire', () => {
  const { source, pass } = practise('tag');
  const id = source.tap({ type: 'chuck', on: true }, 0);
  pass(1);
  expect(source.readOuts().tireKpa).toBeUndefined();
  source.takeBack(id);
  expect(source.readOuts().tireKpa).toBeDefined();
  expect(source.result().timesOn).toBe(0);
});

test('time runs at its speed, and stands still after the end', () => {
  const { source, pass } = practise('steer');
  source.setSpeed(4);
  pass(1);
  expect(source.now()).toBeCloseTo(4, 6);
  source.end();
  pass(1);
  expect(source.now()).toBeCloseTo(4, 6);
});

test('a page that slept goes on where it was, a few seconds later', () => {
  const { source, pass } = practise('steer');
  pass(3600);
  expect(source.now()).toBeCloseTo(5, 6);
});

test('every situation can be started in every unit', () => {
  for (const situation of practiceSituations) {
    for (const unit of ['psi', 'kPa', 'bar'] as const) {
      expect(() => createFill(practiceStart(situation, 1, unit).setup)).not.toThrow();
    }
  }
});
