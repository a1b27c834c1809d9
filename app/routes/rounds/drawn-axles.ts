import type { DrawnAxle, DrawnTire } from '~/components/tire/axle-drawing';
import {
  type AxleLayout,
  axleName,
  axleOf,
  axlesOf,
  positionName,
  type WheelPosition,
} from '~/loads';

export type PlacedTire = Omit<DrawnTire, 'id' | 'name'> & { position: WheelPosition };

/** Tires as the drawing takes them: by axle, front first, left to right. */
export const drawnAxles = (layout: AxleLayout, tires: readonly PlacedTire[]): DrawnAxle[] =>
  axlesOf(layout).map((axle) => ({
    name: axleName(axle),
    tires: tires
      .filter(({ position }) => axleOf(position) === axle)
      .map(({ position, ...tire }) => ({ id: position, name: positionName(position), ...tire })),
  }));
