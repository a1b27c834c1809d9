import { describe, expect, it } from 'vitest';
import { positionsOf, type WheelPosition } from '~/loads';
import { kpaPerPsi } from '~/units';
import { checkOf } from '../rounds/tire-check';
import { dayWords, dueWords, needWords } from './coach-words';

const psi = (value: number) => value * kpaPerPsi;

/** Eight tires at a target of 100 psi, tolerance 2, with what is said of some of them. */
function check(found: Partial<Record<WheelPosition, number | null>>, warm: WheelPosition[] = []) {
  const tires = positionsOf('with-tag').map((position) => {
    const value = position in found ? found[position] : 100;
    return {
      position,
      kpa: value === null || value === undefined ? null : psi(value),
      warm: warm.includes(position),
      targetKpa: psi(100),
      limitKpa: psi(120),
    };
  });
  return checkOf(tires, psi(2));
}

describe('what a coach needs, in words', () => {
  it.each([
    ['all hold', check({}), 'All eight hold.'],
    [
      'one needs air',
      check({ 'steer-right': 96 }),
      'Steer right needs 4 psi before you drive. The other seven hold.',
    ],
    [
      'two need air',
      check({ 'steer-right': 96, 'tag-left': 93.5 }),
      'Steer right needs 4 psi and tag left 6.5 psi before you drive. The other six hold.',
    ],
    [
      'three need air',
      check({ 'steer-left': 95, 'steer-right': 96, 'tag-left': 93 }),
      'Steer left, steer right and tag left need air before you drive. The other five hold.',
    ],
    [
      'a dual is too low, and its mate with it',
      check({ 'drive-left-inner': 80 }),
      'Drive left inner and drive left outer have to be looked at by a technician. Don’t fill them. The other six hold.',
    ],
    [
      'one is over, one was warm',
      check({ 'tag-left': 105, 'tag-right': 110 }, ['tag-right']),
      'Tag left is 5 psi over. Tag right was read warm. Check it again cold. The other six hold.',
    ],
    [
      'one was warm and still low',
      check({ 'steer-left': 95 }, ['steer-left']),
      'Steer left was read warm and still low. Fill it and check again cold. The other seven hold.',
    ],
    [
      'one is left to read',
      check({ 'tag-right': null }),
      'Tag right has not been read. The other seven hold.',
    ],
  ])('%s', (_, found, words) => {
    expect(needWords(found, 'psi')).toBe(words);
  });

  it('says to start when nothing has been read', () => {
    const none = Object.fromEntries(positionsOf('with-tag').map((position) => [position, null]));
    expect(needWords(check(none), 'psi')).toBe(
      'No tire has been read yet. Start a round and check them cold.',
    );
  });

  it('speaks the person’s unit', () => {
    expect(needWords(check({ 'steer-left': 90 }), 'kPa')).toContain('Steer left needs 69 kPa');
    expect(needWords(check({ 'steer-left': 90 }), 'bar')).toContain('Steer left needs 0.69 bar');
  });
});

describe('days in words', () => {
  const now = new Date('2026-12-01T12:00:00Z');
  const days = (count: number) => new Date(now.getTime() + count * 86_400_000);

  it.each([
    [days(12), 'The next cold check is due in 12 days.'],
    [days(1), 'The next cold check is due in 1 day.'],
    [days(0), 'The next cold check is due today.'],
    [days(-3), 'The next cold check was due 3 days ago.'],
    [null, ''],
  ])('%s', (due, words) => {
    expect(dueWords(due, now)).toBe(words);
  });

  it('go by the clock of the place, and name another year', () => {
    expect(dayWords(new Date('2026-11-15T03:00:00Z'), now, 'America/Denver')).toBe('14 November');
    expect(dayWords(new Date('2025-11-15T12:00:00Z'), now)).toBe('15 November 2025');
  });
});
