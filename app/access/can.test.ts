import { describe, expect, it } from 'vitest';
import { type Action, actions, can, type Role, roles } from './can';

const coach = (roundOpen: boolean) => ({ id: 'c1', roundOpen });
const actor = (role?: Role) => ({
  userId: 'u1',
  roles: new Map<string, Role>(role ? [['c1', role]] : [['another', 'owner']]),
});
const allowedTo = (role: Role | undefined, roundOpen = false): Action[] =>
  actions.filter((action) => can(actor(role), action, coach(roundOpen)));

describe('can', () => {
  it('lets an owner do everything', () => {
    expect(allowedTo('owner')).toEqual([...actions]);
  });

  it('lets a driver run rounds and tap, and edit nothing', () => {
    expect(allowedTo('driver')).toEqual([
      'coach:see',
      'log:see',
      'fill:see',
      'fill:tap',
      'round:run',
    ]);
  });

  it('shows a helper nothing outside a round, and neither log nor round ends inside one', () => {
    expect(allowedTo('helper')).toEqual([]);
    expect(allowedTo('helper', true)).toEqual(['coach:see', 'fill:see', 'fill:tap']);
  });

  it('lets a viewer only look', () => {
    expect(allowedTo('viewer')).toEqual(['coach:see', 'log:see', 'fill:see']);
  });

  it('gives nothing to nobody, and nothing to a member of another coach', () => {
    expect(allowedTo(undefined, true)).toEqual([]);
    for (const action of actions) expect(can(null, action, coach(true))).toBe(false);
    expect(roles).toHaveLength(4);
  });
});
