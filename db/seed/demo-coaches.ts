import type { WheelPosition } from '~/loads';

/**
 * The demo's people and coaches. All invented: names, places, pressures, air systems.
 */
export const demoPeople = {
  owner: { email: 'owner@valveside.example', name: 'Marta Quill' },
  driver: { email: 'driver@valveside.example', name: 'Tobias Fenn' },
} as const;

/** One tire's own story: what it loses a month at one temperature, psi. */
export type MonthlyLoss = Partial<Record<WheelPosition, number>>;

export interface DemoCoach {
  name: string;
  layout: 'two-axles' | 'with-tag';
  size: string;
  sidewallPsi: number;
  wheelPsi: number;
  targetPsi: { steer: number; drive: number; tag?: number };
  lowerBy: ('pedal' | 'drain')[];
  rig: { hose: string; chuck: string; gauge: string };
  outcome: 'follows-supply' | 'accessory-tank';
  loss: MonthlyLoss;
  usualLoss: number;
  /** Found low in the last round and left for the owner to fill. */
  left: WheelPosition;
  air: { cutInPsi: number; cutOutPsi: number; fitting: 'service' | 'supply' | 'accessory' };
  seed: number;
  /** Days between rounds. */
  everyDays: number;
  withDriver: boolean;
}

export const demoCoaches: readonly DemoCoach[] = [
  {
    name: 'Heron’s Rest',
    layout: 'with-tag',
    size: '295/80R22.5',
    sidewallPsi: 125,
    wheelPsi: 130,
    targetPsi: { steer: 110, drive: 92, tag: 88 },
    lowerBy: ['drain'],
    rig: { hose: 'Grey hose, 15 m', chuck: 'Closed clip-on', gauge: 'Tee gauge, 0–160 psi' },
    outcome: 'follows-supply',
    loss: { 'steer-right': 6.1, 'drive-left-inner': 2.4 },
    usualLoss: 1.1,
    left: 'steer-right',
    air: { cutInPsi: 98, cutOutPsi: 122, fitting: 'supply' },
    seed: 4107,
    everyDays: 16,
    withDriver: true,
  },
  {
    name: 'Slow Magpie',
    layout: 'two-axles',
    size: '275/80R22.5',
    sidewallPsi: 120,
    wheelPsi: 120,
    targetPsi: { steer: 105, drive: 90 },
    lowerBy: ['pedal', 'drain'],
    rig: { hose: 'Red coil, 12 m', chuck: 'Clip-on with valve', gauge: 'Inline gauge, 0–160 psi' },
    outcome: 'follows-supply',
    loss: { 'steer-left': 5.2 },
    usualLoss: 1.3,
    left: 'steer-left',
    air: { cutInPsi: 94, cutOutPsi: 118, fitting: 'service' },
    seed: 9231,
    everyDays: 21,
    withDriver: false,
  },
];

/** Where rounds were made: invented places, their height and how warm their mornings are. */
export const demoPlaces = [
  { place: 'Larch Hollow, pitch 14', altitudeM: 310, coldestC: 2, warmestC: 17 },
  { place: 'Saltmarsh Landing', altitudeM: 4, coldestC: 8, warmestC: 19 },
  { place: 'Upper Tarn Meadow', altitudeM: 1480, coldestC: -3, warmestC: 11 },
  { place: 'Home drive', altitudeM: 120, coldestC: 4, warmestC: 18 },
] as const;

/** Half a year, in days. */
export const demoDays = 182;
