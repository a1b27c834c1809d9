import { describe, expect, expectTypeOf, it } from 'vitest';
import type { FillEvent, FillSetup } from '~/air';
import { startProblem } from './start-window';
import { closingBody, eventsBody, roundBody } from './wire';
import type { WireEvent } from './wire-events';
import type { WireSetup } from './wire-setup';

type Stamp = 'at' | 'atMs' | 'id' | 'deviceSeq' | 'deviceTime' | 'offsetMs' | 'suspect';
type Own<Event> = Event extends unknown ? Omit<Event, Stamp> : never;
type TypeOf<Event extends { type: string }> = Event['type'];

describe('the wire', () => {
  it('has the engine’s events and the end, field for field', () => {
    expectTypeOf<Own<Exclude<WireEvent, { type: 'ended' }>>>().toEqualTypeOf<Own<FillEvent>>();
    expectTypeOf<Exclude<TypeOf<WireEvent>, TypeOf<FillEvent>>>().toEqualTypeOf<'ended'>();
  });

  it('has every part of the engine’s set-up', () => {
    expectTypeOf<keyof WireSetup>().toEqualTypeOf<keyof FillSetup>();
    expectTypeOf<WireSetup['tire']>().toEqualTypeOf<FillSetup['tire']>();
    expectTypeOf<WireSetup['rig']>().toEqualTypeOf<FillSetup['rig']>();
    expectTypeOf<WireSetup['crew']>().toEqualTypeOf<FillSetup['crew']>();
    expectTypeOf<WireSetup['lowerBy']>().toEqualTypeOf<FillSetup['lowerBy']>();
  });

  it('brings ids to lower case and times to milliseconds, as they are stored', () => {
    const parsed = eventsBody.parse({
      v: 1,
      deviceId: '3F0C8A52-6B1E-4D0F-9A7C-2E5D8B914C66',
      events: [
        {
          type: 'cut-out',
          id: '9C1B1C9E-31A7-4F55-8D20-5B7A6C0F2E11',
          atMs: 0,
          deviceSeq: 1,
          deviceTime: '2026-05-04T09:30:00Z',
          offsetMs: null,
          suspect: true,
        },
      ],
    });
    expect(parsed.deviceId).toBe('3f0c8a52-6b1e-4d0f-9a7c-2e5d8b914c66');
    expect(parsed.events[0]).toMatchObject({
      id: '9c1b1c9e-31a7-4f55-8d20-5b7a6c0f2e11',
      deviceTime: '2026-05-04T09:30:00.000Z',
    });
  });

  it.each(['', 'Nowhere/Land', '0000-01-01', 'x'.repeat(61)])(
    'knows no time zone "%s"',
    (timeZone) => {
      const body = { timeZone };
      const issues = roundBody.safeParse(body).error?.issues ?? [];
      const messages = issues
        .filter(({ path }) => path[0] === 'timeZone')
        .map((one) => one.message);
      expect(messages[0]).toBe('a time zone, such as America/Denver');
    },
  );

  it.each([
    '0000-01-01T00:00:00Z',
    '1969-12-31T23:59:59Z',
    '2300-01-01T00:00:00Z',
    '2026-02-30T00:00:00Z',
    7,
  ])('takes %s for no time', (closedAt) => {
    const issues = closingBody.safeParse({ closedAt }).error?.issues ?? [];
    expect(issues.find(({ path }) => path[0] === 'closedAt')?.message).toMatch(/^a time in UTC/);
  });

  it('wants the whole list of afterwards', () => {
    const body = { v: 1, closedAt: '2026-05-04T09:30:00Z', afterwards: ['chuck-off'] };
    expect(closingBody.safeParse(body).error?.issues).toMatchObject([
      { path: ['afterwards'], message: expect.stringMatching(/^all of chuck-off, caps-on, /) },
    ]);
  });
});

describe('when something may have begun', () => {
  const now = Date.UTC(2026, 4, 4);
  const at = (ms: number) => new Date(now + ms).toISOString();
  const day = 86_400_000;

  it.each([
    [0, undefined],
    [-90 * day, undefined],
    [-90 * day - 1, 'a time at most 90 days ago'],
    [5 * 60_000, undefined],
    [5 * 60_000 + 1, 'a time not in the future (5 min are allowed for clocks)'],
  ])('%i ms from now', (ms, problem) => {
    expect(startProblem(at(ms), now)).toBe(problem);
  });
});
