import type { ReadingKind } from './review-view';

/** Something drawn at a place, px. */
export interface Spot {
  x: number;
  y: number;
}

export interface KindSpot extends Spot {
  kind: ReadingKind;
}

export interface KindLabel {
  kind: ReadingKind;
  /** Left edge and middle of the text, px. */
  left: number;
  middle: number;
}

export interface LabelRoom {
  /** Edges of the plot, px. */
  left: number;
  right: number;
  top: number;
  bottom: number;
  /** Height of a text, px. */
  height: number;
  widthOf: (kind: ReadingKind) => number;
}

interface Box {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** Between a dot's middle and its name, px. */
const away = 12;

/**
 * Names each kind of reading once, at the dot where its name covers the least of dots, curves and
 * other names.
 */
export function placeKindLabels(
  dots: readonly KindSpot[],
  curves: readonly Spot[],
  room: LabelRoom,
): KindLabel[] {
  const taken: Box[] = [];
  return [...new Set(dots.map(({ kind }) => kind))].flatMap((kind) => {
    const tries = dots.filter((dot) => dot.kind === kind).flatMap((dot) => boxesAt(dot, room));
    const costs = tries.map((box) => costOf(box, { dots, curves, taken }));
    const best = tries[costs.indexOf(Math.min(...costs))];
    if (!best) return [];
    taken.push(best);
    return { kind, left: best.left, middle: (best.top + best.bottom) / 2 };
  });
}

/** Right, left, above and below of a dot, as far as that is inside the plot. */
function boxesAt({ x, y, kind }: KindSpot, room: LabelRoom): Box[] {
  const width = room.widthOf(kind);
  const half = room.height / 2;
  const at = (left: number, middle: number): Box => ({
    left,
    right: left + width,
    top: middle - half,
    bottom: middle + half,
  });
  return [
    at(x + away, y),
    at(x - away - width, y),
    at(x - width / 2, y - away - half),
    at(x - width / 2, y + away + half),
  ].filter(
    (box) =>
      box.left >= room.left &&
      box.right <= room.right &&
      box.top >= room.top &&
      box.bottom <= room.bottom,
  );
}

interface Drawn {
  dots: readonly Spot[];
  curves: readonly Spot[];
  taken: readonly Box[];
}

/** A name over another name is unreadable, over a dot hides it, over a curve is only untidy. */
function costOf(box: Box, { dots, curves, taken }: Drawn): number {
  const inside = ({ x, y }: Spot) =>
    x > box.left - 6 && x < box.right + 6 && y > box.top - 4 && y < box.bottom + 4;
  const overlaps = (other: Box) =>
    box.left < other.right &&
    other.left < box.right &&
    box.top < other.bottom &&
    other.top < box.bottom;
  return (
    1000 * taken.filter(overlaps).length +
    50 * dots.filter(inside).length +
    curves.filter(inside).length
  );
}
