import { expect, test } from 'vitest';
import type { Advice, FillEvent, FillSetup } from '~/air';
import { factsOf } from './log-facts';
import { type ScreenInput, screenState } from './screen-state';

const step = 6.894757293168361;
const psi = (value: number) => value * step;
const around = (value: number, half: number) => ({
  p10: psi(value - half),
  p50: psi(value),
  p90: psi(value + half),
});
const setup: FillSetup = {
  tire: { startKpa: psi(101), targetKpa: psi(104.5), toleranceKpa: psi(1), volumeL: 105 },
  rig: { gauge: 'at-chuck', valve: false, stepKpa: step },
  lowerBy: ['pedal'],
  crew: { helper: true },
};
const chuckOn: FillEvent = { type: 'chuck', on: true, at: 5, id: 'a' };

function show(
  advice: Partial<Advice>,
  {
    events = [],
    own = setup,
    ...rest
  }: { events?: FillEvent[]; own?: FillSetup } & Partial<ScreenInput> = {},
) {
  return screenState({
    advice: {
      call: 'wait',
      reason: 'supply-below-tire',
      supplyKpa: around(94, 2),
      tireKpa: around(101, 0.5),
      loaded: 1,
      flowsIn: 0,
      ...advice,
    },
    setup: own,
    unit: 'psi',
    at: 10,
    facts: factsOf(events, own),
    countdown: undefined,
    offBy: undefined,
    pedalAccepted: false,
    wallClock: (at) => new Date(2026, 5, 1, 10, 42, at),
    ...rest,
  });
}

test('wait: framed, not large, with the countdown', () => {
  const countdown = { call: 'wait', endsAt: 28, vague: false } as const;
  const state = show({}, { countdown });
  expect(state).toMatchObject({ side: 'off', act: false, title: 'Wait', time: { figure: '0:18' } });
  expect(state.why).toBe('On now would let air out.');
  expect(state.answers.map((answer) => answer.label)).toEqual(['It’s on']);
});

test('an unknown supply shows its likely range and draws neither headroom nor lack', () => {
  const state = show({
    call: 'read-supply',
    reason: 'supply-unknown',
    supplyKpa: around(103, 9),
  });
  expect(state.side).toBe('unknown');
  expect(state.time).toEqual({ figure: '94–112', after: 'psi?' });
  expect(state.vessel.known).toBe(false);
  expect(state.vessel.supply.text).toBe('?');
});

test('put it on: filled and large, the answering key filled blue', () => {
  const state = show({ call: 'chuck-on', reason: 'supply-above-tire' });
  expect(state).toMatchObject({ side: 'on', act: true, title: 'Put it on' });
  expect(state.answers[0]).toMatchObject({ label: 'It’s on', fill: 'in' });
});

test('take it off: framed and large, the key filled ink, heard as an alert', () => {
  const state = show({ call: 'chuck-off', reason: 'target-reached' }, { events: [chuckOn] });
  expect(state).toMatchObject({ side: 'off', act: true, title: 'Take it off' });
  expect(state.answers[0]).toMatchObject({ label: 'It’s off', fill: 'ink' });
  expect(state.heard).toEqual({
    urgent: true,
    text: 'Take it off. It should be at 104.5 psi now.',
  });
});

test('keep it on: says the clock time by which it is off, and that the gauge reads lower', () => {
  const state = show(
    { call: 'keep-on', reason: 'air-goes-in', offBy: 30 },
    { events: [chuckOn], offBy: 30 },
  );
  expect(state.offBy).toBe('10:42:30');
  expect(state.airMoves).toBe(true);
  expect(state.heard.text).toContain('Off by 10:42:30.');
  expect(state.notice?.text).toMatch(/^Never leave/);
});

test('with a shut-off valve it is opened and closed', () => {
  const own = { ...setup, rig: { ...setup.rig!, valve: true } };
  const on = show({ call: 'chuck-on', reason: 'supply-above-tire' }, { own });
  expect([on.title, on.answers[0]?.label]).toEqual(['Open it', 'It’s open']);
  const off = show({ call: 'chuck-off', reason: 'target-reached' }, { own, events: [chuckOn] });
  expect([off.title, off.answers[0]?.label]).toEqual(['Close it', 'It’s closed']);
});

test('the pedal is not called for before its safety words were read', () => {
  const lower = { call: 'lower-supply', reason: 'lower-to-cut-in', by: 'pedal' } as const;
  const before = show(lower);
  expect(before.body).toBe('pedal-cautions');
  expect(before.answers).toEqual([
    { label: 'I have read this', does: { step: 'accept-pedal' }, fill: 'ink' },
  ]);
  const after = show(lower, { pedalAccepted: true });
  expect(after.body).toBe('vessel');
  expect(after.answers[0]?.does).toEqual({ event: { type: 'lowering', by: 'pedal', on: true } });
});

test('a drain needs no pedal words', () => {
  const state = show({ call: 'lower-supply', reason: 'lower-to-cut-in', by: 'drain' });
  expect([state.title, state.body]).toEqual(['Open the drain', 'vessel']);
});

test.each(['gauge-tire', 'bleed'] as const)('%s gives the vessel’s place to the keypad', (call) => {
  expect(show({ call, reason: 'prove-it' }).body).toBe('tire-keypad');
});

test('"is the chuck still on" has both answers', () => {
  const state = show({ call: 'check', reason: 'chuck-still-on' }, { events: [chuckOn] });
  expect(state.answers.map((answer) => answer.label)).toEqual(['Still on', 'It’s off']);
});

test('low air with the chuck on: take it off, large', () => {
  const state = show({ call: 'check', reason: 'low-air' }, { events: [chuckOn] });
  expect(state).toMatchObject({ side: 'off', act: true });
  expect(state.answers[0]).toMatchObject({ label: 'It’s off', fill: 'ink' });
  expect(state.next).toContain('Take the chuck off');
});

test('out of reach says what this supply gives, and ends the fill', () => {
  const state = show({
    call: 'cannot-reach',
    reason: 'governor-too-low',
    reachKpa: around(98, 1),
  });
  expect(state.why).toBe('This supply gives 98 psi at most.');
  expect(state.next).toMatch(/outside compressor/);
  expect(state.answers[0]?.does).toEqual({ step: 'end' });
});

test('stand aside is said before the first chuck-on, and not after it', () => {
  const on = { call: 'chuck-on', reason: 'supply-above-tire' } as const;
  expect(show(on).notice?.text).toMatch(/never before the sidewall/);
  const off: FillEvent = { type: 'chuck', on: false, at: 9, id: 'b' };
  expect(show(on, { events: [chuckOn, off] }).notice).toBeUndefined();
});

test('a task in the cab is asked of the helper, or of the person alone', () => {
  const wait = { cab: 'set-fast-idle' } as const;
  expect(show(wait).notice?.text).toBe('Helper: set fast idle.');
  const alone = { ...setup, crew: { helper: false } };
  expect(show(wait, { own: alone }).notice?.text).toBe('Set fast idle.');
});

test('a chuck-on that was taken back counts as never said', () => {
  const back: FillEvent = { type: 'taken-back', of: 'a', at: 8, id: 'c' };
  const state = show({}, { events: [chuckOn, back] });
  expect(state.airMoves).toBe(false);
  expect(state.answers[0]?.label).toBe('It’s on');
});

test('governor values are drawn once they are known well enough', () => {
  const vague = show({ cutInKpa: around(92, 10), cutOutKpa: around(118, 2) });
  const kinds = vague.vessel.marks.map((mark) => mark.kind);
  expect(kinds).toContain('cut-out');
  expect(kinds).not.toContain('cut-in');
});

test('the scale stands still while the estimate moves', () => {
  const at = (supply: number) => show({ supplyKpa: around(supply, 2) }).vessel;
  expect(at(95).tire.height).toBe(at(118).tire.height);
});
