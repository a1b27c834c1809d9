import type { Call } from '~/air';

/** A label that wants to stand at a place along the time axis, px. */
export interface WantedLabel {
  call: Call;
  x: number;
  width: number;
}

export interface PlacedLabel {
  /** Index into the wanted labels. */
  index: number;
  /** 0 is nearest to the axis. */
  lane: number;
  /** Left edge of the text, px. */
  left: number;
}

export interface Lanes {
  count: number;
  /** The texts stay between these, px. */
  from: number;
  to: number;
}

/** Between the texts of one lane, px. */
const gap = 8;

/**
 * Those that tell the fill's story keep their words when there is no room for all. What is asked
 * all the time comes last.
 */
const importance: Record<Call, number> = {
  'chuck-on': 0,
  'chuck-off': 0,
  done: 1,
  'cannot-reach': 1,
  bleed: 1,
  check: 2,
  'lower-supply': 2,
  'gauge-tire': 2,
  'stop-lowering': 3,
  wait: 3,
  'keep-on': 4,
  'read-supply': 5,
};

/**
 * Gives labels a lane below the axis, so that no text meets another text, nor the line that leads
 * from another text up to the axis. Those that find no place are left out; the important ones
 * choose first.
 */
export function placeLabels(wanted: readonly WantedLabel[], lanes: Lanes): PlacedLabel[] {
  const order = wanted
    .map(({ call, x }, index) => ({ index, x, rank: importance[call] }))
    .sort((a, b) => a.rank - b.rank || a.x - b.x);
  const placed: (PlacedLabel & Occupied)[] = [];
  for (const { index } of order) {
    const label = wanted[index];
    const place = label && firstPlace(label, placed, lanes);
    if (place) placed.push({ index, ...place });
  }
  return moveUp(placed)
    .sort((a, b) => a.index - b.index)
    .map(({ index, lane, left }) => ({ index, lane, left }));
}

/** Closes lanes that hold nothing; what stood below another still does. */
function moveUp<Label extends { lane: number }>(labels: readonly Label[]): Label[] {
  const used = [...new Set(labels.map(({ lane }) => lane))].sort((a, b) => a - b);
  return labels.map((label) => ({ ...label, lane: used.indexOf(label.lane) }));
}

interface Occupied {
  lane: number;
  left: number;
  right: number;
  x: number;
}

function firstPlace(
  { x, width }: WantedLabel,
  placed: readonly Occupied[],
  { count, from, to }: Lanes,
): Occupied | undefined {
  // The far lanes first: a text hides the axis from what stands farther, so near ones block more.
  for (let lane = count - 1; lane >= 0; lane--) {
    for (const left of [x, x - width]) {
      const place = { lane, left, right: left + width, x };
      const fits = left >= from && left + width <= to;
      if (fits && placed.every((other) => goTogether(place, other))) return place;
    }
  }
  return undefined;
}

function goTogether(a: Occupied, b: Occupied): boolean {
  if (a.lane === b.lane) return a.right + gap <= b.left || b.right + gap <= a.left;
  const [near, far] = a.lane < b.lane ? [a, b] : [b, a];
  return far.x < near.left - gap / 2 || far.x > near.right + gap / 2;
}
