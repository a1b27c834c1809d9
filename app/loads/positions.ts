/** How a coach stands: two axles, or a tag axle behind the drive axle. */
export const axleLayouts = ['two-axles', 'with-tag'] as const;
export type AxleLayout = (typeof axleLayouts)[number];

/** Front first. Steer and tag carry one tire a side, drive carries duals. */
export const axles = ['steer', 'drive', 'tag'] as const;
export type Axle = (typeof axles)[number];

export type Side = 'left' | 'right';

/** Front axle first, then from left to right, as the coach is drawn. */
export const wheelPositions = [
  'steer-left',
  'steer-right',
  'drive-left-outer',
  'drive-left-inner',
  'drive-right-inner',
  'drive-right-outer',
  'tag-left',
  'tag-right',
] as const;
export type WheelPosition = (typeof wheelPositions)[number];

interface Place {
  axle: Axle;
  side: Side;
  name: string;
  mate: WheelPosition | null;
  opposite: WheelPosition;
}

const places: Record<WheelPosition, Place> = {
  'steer-left': {
    axle: 'steer',
    side: 'left',
    name: 'Steer left',
    mate: null,
    opposite: 'steer-right',
  },
  'steer-right': {
    axle: 'steer',
    side: 'right',
    name: 'Steer right',
    mate: null,
    opposite: 'steer-left',
  },
  'drive-left-outer': {
    axle: 'drive',
    side: 'left',
    name: 'Drive left outer',
    mate: 'drive-left-inner',
    opposite: 'drive-right-outer',
  },
  'drive-left-inner': {
    axle: 'drive',
    side: 'left',
    name: 'Drive left inner',
    mate: 'drive-left-outer',
    opposite: 'drive-right-inner',
  },
  'drive-right-inner': {
    axle: 'drive',
    side: 'right',
    name: 'Drive right inner',
    mate: 'drive-right-outer',
    opposite: 'drive-left-inner',
  },
  'drive-right-outer': {
    axle: 'drive',
    side: 'right',
    name: 'Drive right outer',
    mate: 'drive-right-inner',
    opposite: 'drive-left-outer',
  },
  'tag-left': { axle: 'tag', side: 'left', name: 'Tag left', mate: null, opposite: 'tag-right' },
  'tag-right': { axle: 'tag', side: 'right', name: 'Tag right', mate: null, opposite: 'tag-left' },
};

// Once round the coach, from the driver's corner back along the left side and forward along the
// right, so that nobody walks a side twice. At a pair of duals the outer one comes first on both
// sides: its stem is at hand, and the inner one is reached past it.
const walk: readonly WheelPosition[] = [
  'steer-left',
  'drive-left-outer',
  'drive-left-inner',
  'tag-left',
  'tag-right',
  'drive-right-outer',
  'drive-right-inner',
  'steer-right',
];

const axleNames: Record<Axle, string> = { steer: 'Steer', drive: 'Drive', tag: 'Tag' };

const stands = (position: WheelPosition, layout: AxleLayout) =>
  layout === 'with-tag' || places[position].axle !== 'tag';

/** The coach's axles, front first. */
export const axlesOf = (layout: AxleLayout): Axle[] =>
  axles.filter((axle) => layout === 'with-tag' || axle !== 'tag');

/** Every tire of the coach in the order in which it is drawn: front first, left to right. */
export const positionsOf = (layout: AxleLayout): WheelPosition[] =>
  wheelPositions.filter((position) => stands(position, layout));

/** Every tire of the coach in the order in which a cold check walks round it. */
export const walkOrderOf = (layout: AxleLayout): WheelPosition[] =>
  walk.filter((position) => stands(position, layout));

/** One axle's tires from left to right. */
export const positionsOnAxle = (axle: Axle): WheelPosition[] =>
  wheelPositions.filter((position) => places[position].axle === axle);

/** "Steer left", "Drive right inner". */
export const positionName = (position: WheelPosition): string => places[position].name;
/** "Steer", "Drive", "Tag". */
export const axleName = (axle: Axle): string => axleNames[axle];
export const axleOf = (position: WheelPosition): Axle => places[position].axle;
export const sideOf = (position: WheelPosition): Side => places[position].side;
/** The other tire of a dual, or null where the tire stands alone. */
export const dualMateOf = (position: WheelPosition): WheelPosition | null => places[position].mate;

/** The tire in the same place on the other side. */
export const oppositeOf = (position: WheelPosition): WheelPosition => places[position].opposite;

export const isWheelPosition = (text: string): text is WheelPosition => Object.hasOwn(places, text);
