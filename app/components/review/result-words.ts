import {
  formatDuration,
  formatPressure,
  formatPressureDifference,
  gaugeKpa,
  kpaDifference,
  type PressureUnit,
  seconds,
} from '~/units';
import type { ReviewResult } from './review-model';

/** "From 101.0 to 104.5 psi, target 104.5. On 2 times, 1:34 in all. No air lost." */
export function resultSentence(result: ReviewResult, unit: PressureUnit): string {
  return [fromTo(result, unit), `${onWords(result)}.`, `${lostWords(result, unit)}.`].join(' ');
}

function fromTo({ startKpa, endKpa, targetKpa }: ReviewResult, unit: PressureUnit): string {
  const figure = (kpa: number) => formatPressure(gaugeKpa(kpa), unit, { withUnit: false });
  if (endKpa === null) {
    return `From ${figure(startKpa)} ${unit}, target ${figure(targetKpa)}. Not gauged at the end.`;
  }
  return `From ${figure(startKpa)} to ${figure(endKpa)} ${unit}, target ${figure(targetKpa)}.`;
}

function onWords({ timesOn, secondsOn }: ReviewResult): string {
  if (timesOn === 0) return 'Never on';
  const time = formatDuration(seconds(secondsOn));
  return timesOn === 1 ? `On once, for ${time}` : `On ${timesOn} times, ${time} in all`;
}

/** "No air lost", or how much, to the last figure that is shown. */
export function lostWords({ lostKpa }: ReviewResult, unit: PressureUnit): string {
  const lost = formatPressureDifference(kpaDifference(lostKpa), unit);
  const none = formatPressureDifference(kpaDifference(0), unit);
  return lost === none ? 'No air lost' : `${lost} lost`;
}

export interface Figure {
  name: string;
  value: string;
}

/** The figures of the result, for a list of definitions. */
export function resultFigures(result: ReviewResult, unit: PressureUnit): Figure[] {
  const shown = (kpa: number) => formatPressure(gaugeKpa(kpa), unit);
  const { endKpa, timesOn, secondsOn } = result;
  return [
    { name: 'Start', value: shown(result.startKpa) },
    { name: 'End', value: endKpa === null ? 'not gauged' : shown(endKpa) },
    { name: 'Target', value: shown(result.targetKpa) },
    { name: 'Time on', value: formatDuration(seconds(secondsOn)) },
    { name: 'Put on', value: timesOn === 1 ? '1 time' : `${timesOn} times` },
    {
      name: 'Air lost',
      value: formatPressureDifference(kpaDifference(result.lostKpa), unit),
    },
    { name: 'Highest supply', value: shown(result.highestSupplyKpa) },
    { name: 'Lowest supply', value: shown(result.lowestSupplyKpa) },
  ];
}
