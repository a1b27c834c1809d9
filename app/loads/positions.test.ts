import { describe, expect, it } from 'vitest';
import {
  axleLayouts,
  axleOf,
  axlesOf,
  dualMateOf,
  isWheelPosition,
  oppositeOf,
  positionName,
  positionsOf,
  positionsOnAxle,
  sideOf,
  walkOrderOf,
  wheelPositions,
} from './index';

describe('wheel positions', () => {
  it('are six on two axles and eight with a tag', () => {
    expect(positionsOf('two-axles')).toHaveLength(6);
    expect(positionsOf('with-tag')).toEqual([...wheelPositions]);
    expect(axlesOf('two-axles')).toEqual(['steer', 'drive']);
    expect(axlesOf('with-tag')).toEqual(['steer', 'drive', 'tag']);
  });

  it.each(axleLayouts)('are each walked past once: %s', (layout) => {
    expect(walkOrderOf(layout).toSorted()).toEqual(positionsOf(layout).toSorted());
  });

  it.each(axleLayouts)(
    'are walked back along the left and forward along the right: %s',
    (layout) => {
      const walk = walkOrderOf(layout);
      const sides = walk.map(sideOf).join(' ');
      expect(walk[0]).toBe('steer-left');
      expect(walk.at(-1)).toBe('steer-right');
      expect(sides).toMatch(/^(left ?)+(right ?)+$/);
    },
  );

  it('come with the outer tire of a dual before the inner', () => {
    const walk = walkOrderOf('with-tag');
    for (const side of ['left', 'right'] as const)
      expect(walk.indexOf(`drive-${side}-inner`) - walk.indexOf(`drive-${side}-outer`)).toBe(1);
  });

  it('have names that say where they are', () => {
    expect(positionName('steer-left')).toBe('Steer left');
    expect(positionName('drive-right-inner')).toBe('Drive right inner');
  });

  it('know their mate and their opposite, both ways', () => {
    for (const position of wheelPositions) {
      const mate = dualMateOf(position);
      expect(mate === null).toBe(axleOf(position) !== 'drive');
      if (mate) expect([dualMateOf(mate), sideOf(mate)]).toEqual([position, sideOf(position)]);
      expect(oppositeOf(oppositeOf(position))).toBe(position);
      expect(sideOf(oppositeOf(position))).not.toBe(sideOf(position));
      expect(positionsOnAxle(axleOf(position))).toContain(oppositeOf(position));
    }
  });

  it('are told from other words', () => {
    expect(isWheelPosition('tag-left')).toBe(true);
    expect(isWheelPosition('toString')).toBe(false);
  });
});
