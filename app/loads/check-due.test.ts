import { describe, expect, it } from 'vitest';
import { nextCheckDue } from './index';

describe('the next cold check', () => {
  it('is due thirty days after the last one', () => {
    // trade press: 1 to 3 psi a month
    const due = nextCheckDue(new Date('2031-02-10T07:30:00Z'));
    expect(due?.toISOString()).toBe('2031-03-12T07:30:00.000Z');
  });

  it('keeps to a period of the owner’s own', () => {
    const due = nextCheckDue(new Date('2031-02-10T07:30:00Z'), 14);
    expect(due?.toISOString()).toBe('2031-02-24T07:30:00.000Z');
  });

  it('is not known before the first', () => {
    expect(nextCheckDue(null)).toBeNull();
  });

  it('refuses a period or a date that cannot be', () => {
    expect(() => nextCheckDue(new Date(0), 0)).toThrow('periodDays: 0 is not above 0');
    expect(() => nextCheckDue(new Date('never'))).toThrow('lastAt: not a date');
  });
});
