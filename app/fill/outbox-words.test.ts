import { describe, expect, it } from 'vitest';
import type { OutboxItem, RefusedItem } from './outbox-items';
import { openFillOf, pendingWords, refusedLine, refusedWords } from './outbox-words';
import { emptyPhone } from './store';

const { outbox } = emptyPhone;
const item = {
  subject: 'run',
  id: 'r',
  address: '',
  body: {},
  needs: null,
  order: 1,
} as OutboxItem;
const refused = (problem: Partial<RefusedItem['problem']>): RefusedItem => ({
  item,
  problem: { status: 409, code: 'x', detail: 'Another fill is open. End it first.', ...problem },
});

describe('words of the outbox', () => {
  it('are none while nothing waits', () => {
    expect([pendingWords(outbox), refusedWords(outbox)]).toEqual([null, null]);
  });

  it('count what is not sent and say why it waits', () => {
    expect(pendingWords({ ...outbox, pending: 3 })).toBe('3 not sent yet.');
    expect(pendingWords({ ...outbox, pending: 3, retrying: true })).toBe(
      '3 not sent yet. Trying again.',
    );
    expect(pendingWords({ ...outbox, pending: 1, paused: true })).toBe(
      '1 not sent yet. You are signed out.',
    );
    expect(refusedWords({ ...outbox, refused: [refused({})] })).toBe('1 refused.');
  });

  it('say what was refused, why, and what is expected', () => {
    expect(refusedLine(refused({}))).toBe('Start of the fill: Another fill is open. End it first.');
    const tap = { ...item, subject: 'event', body: { type: 'tire-reading' } } as OutboxItem;
    const { problem } = refused({ field: 'kpa', expected: '0 to 1400 kPa', detail: 'No.' });
    expect(refusedLine({ item: tap, problem })).toBe(
      'Tap tire-reading: No. Expected as kpa: 0 to 1400 kPa.',
    );
  });

  it('name the fill that is in the way', () => {
    expect(openFillOf(refused({ code: 'fill-open', value: 'f1' }))).toBe('f1');
    expect(openFillOf(refused({ code: 'other-body', value: 'f1' }))).toBeNull();
  });
});
