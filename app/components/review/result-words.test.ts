import { describe, expect, it } from 'vitest';
import { kpaPerPsi } from '~/units';
import { callWords } from './entry-words';
import { looksUntilLong, nextLookMs } from './next-look';
import { notesOf } from './note-words';
import { resultFigures, resultSentence } from './result-words';
import type { ReviewEntry, ReviewResult } from './review-model';
import { clockTime, dayOf, minuteOf, sinceStart } from './review-time';

const result: ReviewResult = {
  startKpa: 101 * kpaPerPsi,
  endKpa: 104.5 * kpaPerPsi,
  targetKpa: 104.5 * kpaPerPsi,
  toleranceKpa: 7,
  seconds: 400,
  secondsOn: 94,
  timesOn: 2,
  lostKpa: 0,
  secondsBelow: 0,
  highestSupplyKpa: 118 * kpaPerPsi,
  lowestSupplyKpa: 92 * kpaPerPsi,
  outcome: 'done',
  engineVersion: '1',
  lastSeq: 30,
};

describe('the result in one sentence', () => {
  it('says from, to, target, how often and how long, and what was lost', () => {
    expect(resultSentence(result, 'psi')).toBe(
      'From 101.0 to 104.5 psi, target 104.5. On 2 times, 1:34 in all. No air lost.',
    );
  });

  it('speaks the reader’s unit', () => {
    expect(resultSentence(result, 'kPa')).toMatch(/^From 696 to 721 kPa, target 721\./);
    expect(resultFigures(result, 'bar')[0]).toEqual({ name: 'Start', value: '6.96 bar' });
  });

  it('says what was lost, once, never, and not gauged', () => {
    expect(resultSentence({ ...result, lostKpa: 2.1 }, 'psi')).toMatch(/0\.3 psi lost\.$/);
    expect(resultSentence({ ...result, timesOn: 1 }, 'psi')).toContain('On once, for 1:34.');
    expect(resultSentence({ ...result, timesOn: 0, secondsOn: 0 }, 'psi')).toContain('Never on.');
    expect(resultSentence({ ...result, endKpa: null }, 'psi')).toContain('Not gauged at the end.');
  });

  it('calls what is below the last figure no loss', () => {
    expect(resultSentence({ ...result, lostKpa: 0.2 }, 'psi')).toContain('No air lost.');
  });
});

describe('the notes', () => {
  const entry = (use: ReviewEntry['use']) => ({ use }) as ReviewEntry;

  it('are none when everything counted', () => {
    expect(notesOf([entry('used')], false)).toEqual([]);
  });

  it('say what did not count and why', () => {
    const notes = notesOf([entry('after-end'), entry('after-end'), entry('already-ended')], true);
    expect(notes.join(' ')).toMatch(/Another fill .* already ended .* 2 events came after the end/);
  });
});

describe('times', () => {
  const at = new Date('2026-11-14T06:05:09Z');

  it('are those of the round’s own zone', () => {
    expect(clockTime(at, 'America/Denver')).toBe('23:05:09');
    expect(minuteOf(at, 'Europe/Vienna')).toMatch(/^0?7:05$/);
    expect(dayOf(at, 'America/Denver')).toBe('13 November 2026');
  });

  it('since the start never run ahead', () => {
    expect(sinceStart(94.9)).toBe('1:34');
  });
});

describe('waiting for the result', () => {
  it('asks ever more rarely, says when it takes long, and stops after about a minute', () => {
    let looks = 0;
    let sum = 0;
    for (let ms = nextLookMs(0); ms !== undefined; ms = nextLookMs(++looks)) sum += ms;
    expect(looks).toBeGreaterThan(looksUntilLong);
    expect(sum).toBeGreaterThan(45_000);
    expect(sum).toBeLessThan(90_000);
  });
});

describe('calls on record', () => {
  it('speak of the valve where there is one', () => {
    expect(callWords('chuck-off', true)).toBe('Close it');
    expect(callWords('chuck-off', false)).toBe('Take it off');
    expect(callWords('wait', true)).toBe('Wait');
  });
});
