import { describe, expect, it } from 'vitest';
import type { CoachBasis } from '~/fill/fill-setup';
import { emptyPhone, type RoundState } from '~/fill/store';
import { positionsOf, type WheelPosition } from '~/loads';
import { kpaPerPsi } from '~/units';
import { whyNoFill } from './fill-words';
import { findingsToSay, outsideCompressorWords } from './finding-words';
import { type RoundPageData, viewRound } from './round-data';
import { groupsOf } from './tire-groups';

const psi = (value: number) => value * kpaPerPsi;

const coach: CoachBasis = {
  id: 'coach',
  name: 'Late Heron',
  layout: 'two-axles',
  toleranceKpa: psi(2),
  lowerBy: [],
  rig: { hose: 'a', chuck: 'b', gauge: 'c', gaugePlace: 'at-chuck', hasValve: false, stepKpa: 7 },
  wheels: positionsOf('two-axles').map((position) => ({
    tireId: `tire ${position}`,
    position,
    size: '295/75R22.5',
    targetKpa: psi(100),
    limitKpa: psi(120),
    volumeL: 140,
  })),
  profile: null,
};

let count = 0;
function reading(position: WheelPosition, value: number, warm = false) {
  count += 1;
  const readAt = new Date(1_800_000_000_000 + count * 60_000).toISOString();
  return { id: `reading ${count}`, tireId: `tire ${position}`, kpa: psi(value), warm, readAt };
}

function roundWith(readings: RoundState['readings']): RoundState {
  return {
    id: 'round',
    coachId: 'coach',
    startedAt: '2027-01-10T08:00:00.000Z',
    place: '',
    altitudeM: 0,
    ambientC: 10,
    timeZone: 'UTC',
    withHelper: false,
    cautionsAt: null,
    closedAt: null,
    afterwards: [],
    readings,
  };
}

function page(readings: RoundState['readings'], changed: Partial<RoundPageData> = {}) {
  const fitting = { outcome: 'follows-supply' as const, testedAt: new Date() };
  const rights = { mayRun: true, mayEdit: true, unit: 'psi' as const };
  const none = { fills: [], newestFill: null };
  return { round: roundWith(readings), coach, fitting, ...none, ...rights, ...changed };
}

const view = (readings: RoundState['readings'], changed?: Partial<RoundPageData>) =>
  viewRound(page(readings, changed), emptyPhone);

const at = (shown: ReturnType<typeof view>, position: WheelPosition) =>
  shown.tires.find((tire) => tire.position === position)!;

const allRead = (changed: Partial<Record<WheelPosition, number>> = {}) =>
  positionsOf('two-axles').map((position) => reading(position, changed[position] ?? 100));

describe('a round as it stands', () => {
  it('asks for the tires in the order of the walk', () => {
    expect(view([]).next?.position).toBe('steer-left');
    expect(view([reading('steer-left', 100)]).next?.position).toBe('drive-left-outer');
    const last = view(allRead());
    expect([last.next, last.complete]).toEqual([undefined, true]);
  });

  it('counts the reading that came last', () => {
    const shown = view([reading('steer-left', 80), reading('steer-left', 99)]);
    expect(at(shown, 'steer-left').kpa).toBeCloseTo(psi(99), 9);
    expect(at(shown, 'steer-left').verdict.kind).toBe('in-tolerance');
  });

  it('takes this phone’s readings before the server’s', () => {
    const own = roundWith([reading('steer-left', 95)]);
    const phone = { ...emptyPhone, rounds: { round: own } };
    expect(at(viewRound(page([]), phone), 'steer-left').verdict.kind).toBe('needs-air');
  });
});

describe('whether a tire may be filled now', () => {
  const low = allRead({ 'steer-left': 95 });
  const why = (shown: ReturnType<typeof view>, position: WheelPosition = 'steer-left') =>
    whyNoFill(shown, at(shown, position));

  it('it may when it wants air and all is ready', () => {
    expect(why(view(low))).toBe('');
  });

  it.each([
    [
      'no rig',
      { coach: { ...coach, rig: null } },
      'The hose, chuck and gauge are not described yet.',
    ],
    ['no test', { fitting: null }, 'The air fitting has not been tested yet.'],
    [
      'no air',
      { fitting: { outcome: 'no-air' as const, testedAt: new Date() } },
      'The fitting gave no air.',
    ],
  ])('it may not with %s', (_, changed, words) => {
    expect(why(view(low, changed))).toBe(words);
  });

  it('it may not while another fill is open', () => {
    const position = 'steer-right' as const;
    const fill = { id: 'f', tireId: `tire ${position}`, position, startedAt: '', how: null };
    expect(why(view(low, { fills: [{ ...fill, endKpa: null }] }))).toBe(
      'A fill of steer right is open. End it first.',
    );
  });

  it('it may not before its dual is read, nor when either was run flat', () => {
    expect(why(view([reading('drive-left-outer', 95)]), 'drive-left-outer')).toBe(
      'Read drive left inner first.',
    );
    const flat = view(allRead({ 'drive-left-outer': 80, 'drive-left-inner': 95 }));
    expect(why(flat, 'drive-left-outer')).toBe('No fill is timed for this tire.');
    expect(why(flat, 'drive-left-inner')).toBe('No fill is timed for this tire.');
  });
});

describe('the result of a cold check', () => {
  it('puts what is dangerous first and walks round within a group', () => {
    const shown = view(
      allRead({
        'steer-right': 95,
        'steer-left': 96,
        'drive-left-outer': 70,
        'drive-right-inner': 110,
      }),
    );
    const groups = groupsOf(shown.tires, 'two-axles');
    expect(
      groups.map(({ title, group }) => [title, group.map(({ position }) => position)]),
    ).toEqual([
      ['Do not fill', ['drive-left-outer', 'drive-left-inner']],
      ['Fill up', ['steer-left', 'steer-right']],
      ['Let down', ['drive-right-inner']],
      ['Leave as they are', ['drive-right-outer']],
    ]);
  });

  it('names duals that differ, unless a technician has to look at them anyway', () => {
    const say = (changed: Parameters<typeof allRead>[0]) => {
      const shown = view(allRead(changed));
      return findingsToSay(shown.findings, shown.tires).map(({ kind, higher }) => [kind, higher]);
    };
    expect(say({ 'drive-left-outer': 94 })).toEqual([['duals-differ', 'drive-left-inner']]);
    expect(say({ 'drive-left-outer': 95 })).toEqual([]);
    expect(say({ 'drive-left-outer': 60 })).toEqual([]);
  });

  it('says that an outside compressor is better for much air only', () => {
    expect(outsideCompressorWords(view(allRead({ 'steer-left': 95 })).tires)).toBeUndefined();
    const much = Object.fromEntries(positionsOf('two-axles').map((position) => [position, 81]));
    expect(outsideCompressorWords(view(allRead(much)).tires)).toBeUndefined();
    const large = { ...coach, wheels: coach.wheels.map((wheel) => ({ ...wheel, volumeL: 210 })) };
    expect(outsideCompressorWords(view(allRead(much), { coach: large }).tires)).toContain(
      'An outside compressor is the better tool.',
    );
  });
});
