import { describe, expect, it } from 'vitest';
import { type KindSpot, placeKindLabels } from './reading-labels';

const room = { left: 0, right: 300, top: 0, bottom: 200, height: 20, widthOf: () => 80 };
const disc = (x: number, y: number): KindSpot => ({ kind: 'wheel-gauge', x, y });
const square = (x: number, y: number): KindSpot => ({ kind: 'dash-gauge', x, y });

describe('the names of the readings', () => {
  it('name each kind once', () => {
    const dots = [disc(50, 50), disc(150, 60), square(60, 150), square(200, 150)];
    const kinds = placeKindLabels(dots, [], room).map(({ kind }) => kind);
    expect(kinds).toEqual(['wheel-gauge', 'dash-gauge']);
  });

  it('stand at the dot where they hide no other dot', () => {
    const crowd = [0, 1, 2, 3, 4].flatMap((column) =>
      [60, 80, 100, 120, 140].map((y) => disc(10 + 15 * column, y)),
    );
    const dots = [...crowd, disc(150, 40)];
    const [name] = placeKindLabels(dots, [], room);
    const hidden = dots.filter(
      ({ x, y }) => x > name!.left && x < name!.left + 80 && Math.abs(y - name!.middle) < 10,
    );
    expect(hidden).toEqual([]);
  });

  it('are left out where the plot has no room for them', () => {
    expect(placeKindLabels([disc(20, 20)], [], { ...room, right: 60 })).toEqual([]);
  });

  it('do not stand on one another', () => {
    const [first, second] = placeKindLabels([disc(100, 100), square(104, 100)], [], room);
    const apart =
      Math.abs(first!.middle - second!.middle) >= 20 || Math.abs(first!.left - second!.left) >= 80;
    expect(apart).toBe(true);
  });
});
