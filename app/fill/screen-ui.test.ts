import { expect, test } from 'vitest';
import type { Advice } from '~/air';
import { blankUi, nextUi, type ScreenUi } from './screen-ui';

const step = 6.894757293168361;
const frame = { gaugeStepKpa: step, count: 3 };
const spread = (psi: number) => ({ p10: (psi - 1) * step, p50: psi * step, p90: (psi + 1) * step });
const entered = { id: 'a', text: 'Gauge at the wheel 104 psi', until: 20 };

function advised(ui: ScreenUi, advice: Partial<Advice>, pressing = false): ScreenUi {
  const full: Advice = {
    call: 'wait',
    reason: 'supply-below-tire',
    supplyKpa: spread(104),
    tireKpa: spread(101),
    loaded: 1,
    flowsIn: 0,
    ...advice,
  };
  return nextUi(ui, { type: 'advised', advice: full, at: 10, now: 10, pressing, frame });
}

const middleReading = (ui: ScreenUi) =>
  advised(nextUi(ui, { type: 'recorded', entered, index: 1 }), {});

test('a call for the tire’s reading opens its keypad, and another call closes it', () => {
  const gauging = advised(blankUi, { call: 'gauge-tire', reason: 'prove-it' });
  expect(gauging.keypad).toEqual({ reads: 'tire', text: '', problem: undefined });
  expect(advised(gauging, {}).keypad).toBeUndefined();
});

test('what was begun to be typed is never taken away by another call', () => {
  const gauging = advised(blankUi, { call: 'gauge-tire', reason: 'prove-it' });
  const typing = nextUi(gauging, { type: 'type', text: '10' });
  expect(advised(typing, {}).keypad?.text).toBe('10');
});

test('no keypad opens under a thumb', () => {
  expect(advised(blankUi, { call: 'gauge-tire', reason: 'prove-it' }, true).keypad).toBeUndefined();
});

test('after three middle values the next prompt opens the keypad blank', () => {
  const thrice = middleReading(middleReading(middleReading(advised(blankUi, {}))));
  expect(thrice.keypad).toBeUndefined();
  const asked = advised(thrice, { readIn: 0 });
  expect(asked.keypad).toEqual({ reads: 'wheel-gauge', text: '', problem: undefined });
  const typed = advised(nextUi(asked, { type: 'recorded', entered, index: -1 }), { readIn: 0 });
  expect(typed.keypad).toBeUndefined();
});

test('a refusal keeps what was typed, and the next key clears it', () => {
  const open = nextUi(blankUi, { type: 'open-keypad', reads: 'wheel-gauge' });
  const wrong = nextUi(nextUi(open, { type: 'type', text: '12..5' }), {
    type: 'refuse',
    problem: 'no',
  });
  expect(wrong.keypad).toMatchObject({ text: '12..5', problem: 'no' });
  expect(nextUi(wrong, { type: 'type', text: '12.5' }).keypad?.problem).toBeUndefined();
});

test('the time that was said for a hold may come earlier at once, later only by a good deal', () => {
  const keep = (ui: ScreenUi, offBy: number) =>
    advised(ui, { call: 'keep-on', reason: 'air-goes-in', offBy });
  const said = keep(blankUi, 60);
  expect(keep(said, 58).offBy).toBe(60);
  expect(keep(said, 70).offBy).toBe(60);
  expect(keep(said, 50).offBy).toBe(50);
  expect(keep(said, 80).offBy).toBe(80);
  expect(advised(said, { call: 'chuck-off', reason: 'target-reached' }).offBy).toBe(60);
  expect(advised(said, { call: 'wait' }).offBy).toBeUndefined();
});
