import type { FillSetup, PracticeOptions } from '~/air';
import { type PressureUnit, psi, psiToKpa } from '~/units';
import type { PracticeStart } from './practice-source';

const kpa = (value: number) => psiToKpa(psi(value));

/** One situation to practise in. The figures are invented; the coach behind them is seeded. */
export interface PracticeSituation {
  key: string;
  name: string;
  /** What is special about it, in one line. */
  about: string;
  tireName: string;
  startPsi: number;
  targetPsi: number;
  limitPsi: number;
  volumeL: number;
  cutInPsi: number;
  cutOutPsi: number;
  supplyPsi: number;
  helper: boolean;
  lowerBy: NonNullable<FillSetup['lowerBy']>;
  valve?: boolean;
  engine?: PracticeOptions['engine'];
  fitting?: PracticeOptions['fitting'];
}

const usual = {
  limitPsi: 120,
  volumeL: 105,
  helper: true,
  lowerBy: ['pedal'] as NonNullable<FillSetup['lowerBy']>,
};

export const practiceSituations: readonly PracticeSituation[] = [
  {
    ...usual,
    key: 'steer',
    name: 'A steer tire',
    about: 'The usual job: the tire lies inside the supply’s swing. A helper sits at the pedal.',
    tireName: 'Steer left',
    startPsi: 101,
    targetPsi: 106,
    cutInPsi: 93,
    cutOutPsi: 121,
    supplyPsi: 112,
  },
  {
    ...usual,
    key: 'tag',
    name: 'A tag tire',
    about: 'The tire lies below cut-in. Air goes in nearly all the time.',
    tireName: 'Tag right',
    startPsi: 80,
    targetPsi: 88,
    limitPsi: 110,
    cutInPsi: 92,
    cutOutPsi: 118,
    supplyPsi: 104,
  },
  {
    ...usual,
    key: 'headroom',
    name: 'Little headroom',
    about: 'The target lies just below cut-out. Only the top of each rise gives air.',
    tireName: 'Steer right',
    startPsi: 107,
    targetPsi: 111,
    cutInPsi: 91,
    cutOutPsi: 117,
    supplyPsi: 99,
  },
  {
    ...usual,
    key: 'alone',
    name: 'Alone, with a drain',
    about: 'No helper. You walk between seat and wheel, and lower the supply by its drain.',
    tireName: 'Steer left',
    startPsi: 100,
    targetPsi: 104,
    cutInPsi: 94,
    cutOutPsi: 122,
    supplyPsi: 116,
    helper: false,
    lowerBy: ['drain'],
  },
  {
    ...usual,
    key: 'valve',
    name: 'A hose with a valve',
    about: 'The chuck stays on closed. You open and close a ball valve.',
    tireName: 'Drive left outer',
    startPsi: 88,
    targetPsi: 94,
    limitPsi: 115,
    cutInPsi: 90,
    cutOutPsi: 118,
    supplyPsi: 97,
    valve: true,
  },
  {
    ...usual,
    key: 'reach',
    name: 'Out of reach',
    about: 'This governor cuts out below the target. See how that is found out.',
    tireName: 'Steer left',
    startPsi: 106,
    targetPsi: 114,
    cutInPsi: 84,
    cutOutPsi: 107,
    supplyPsi: 98,
  },
];

const tolerancePsi = 1;

/** A start of that situation; another seed is another coach, gauge and chuck. */
export function practiceStart(
  situation: PracticeSituation,
  seed: number,
  unit: PressureUnit,
): PracticeStart {
  const { tireName, volumeL, valve = false } = situation;
  const startKpa = kpa(situation.startPsi);
  const limitKpa = kpa(situation.limitPsi);
  const stepKpa = unit === 'psi' ? kpa(1) : 10;
  return {
    tireName,
    unit,
    coach: {
      seed,
      tire: { startKpa, volumeL, limitKpa },
      governor: { cutInKpa: kpa(situation.cutInPsi), cutOutKpa: kpa(situation.cutOutPsi) },
      supplyKpa: kpa(situation.supplyPsi),
      fitting: situation.fitting ?? 'service',
      engine: situation.engine ?? 'idle',
      loaded: false,
      wheelGauge: { stepKpa },
      dashGauge: { stepKpa: kpa(2) },
      governorJitterKpa: kpa(0.4),
    },
    setup: {
      tire: {
        startKpa,
        targetKpa: kpa(situation.targetPsi),
        toleranceKpa: kpa(tolerancePsi),
        volumeL,
        limitKpa,
      },
      rig: { gauge: valve ? 'above-valve' : 'at-chuck', valve, stepKpa },
      lowerBy: situation.lowerBy,
      crew: { helper: situation.helper, walkSeconds: 12 },
      seed,
    },
  };
}
