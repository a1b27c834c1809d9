import type { VesselMark } from '~/fill/vessel-state';

/** Height of a mark's text, px: what has to stay clear of its neighbour. */
const markPx = 20;

/** Below these heights of a vessel its tags are small, or there is no room for any, px. */
const lowPx = 130;
const barePx = 64;

export type VesselSize = 'usual' | 'low' | 'bare';

/** How much writing a vessel of that height can hold. */
export function vesselSize(heightPx: number): VesselSize {
  if (heightPx < barePx) return 'bare';
  return heightPx < lowPx ? 'low' : 'usual';
}

/** Which mark keeps its text where two would overlap. */
const rank: Record<VesselMark['kind'], number> = { target: 0, limit: 1, 'cut-out': 2, 'cut-in': 3 };

/** The marks whose text finds room, the more telling first. */
export function placeMarks(marks: readonly VesselMark[], heightPx: number): VesselMark[] {
  const placed: VesselMark[] = [];
  for (const mark of [...marks].sort((a, b) => rank[a.kind] - rank[b.kind])) {
    const px = toPx(mark.height, heightPx);
    const inside = px >= markPx / 2 && px <= heightPx - markPx / 2;
    const free = placed.every((other) => Math.abs(toPx(other.height, heightPx) - px) >= markPx);
    if (inside && free) placed.push(mark);
  }
  return placed;
}

function toPx(percent: number, heightPx: number): number {
  return (percent / 100) * heightPx;
}
