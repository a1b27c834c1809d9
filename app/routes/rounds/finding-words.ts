import { type AxleFinding, positionName } from '~/loads';
import type { PressureUnit } from '~/units';
import { isFilled, type RoundTire } from './round-data';
import { amount, wantsAction } from './verdict-words';

/** "Drive left outer is 7 psi above drive left inner, its dual. …" */
export function findingWords({ kind, higher, lower, byKpa }: AxleFinding, unit: PressureUnit) {
  const other = positionName(lower).toLowerCase();
  const start = `${positionName(higher)} is ${amount(byKpa, unit)} above ${other}`;
  return kind === 'duals-differ'
    ? `${start}, its dual. The higher one carries more than its share.`
    : `${start}. The two sides should match.`;
}

/**
 * The findings that nothing else on the page says: a pair is not named while one of it is to be
 * filled up, let down or taken off for its own sake, or has been filled since. Duals always are,
 * unless a technician has to look at them anyway.
 */
export function findingsToSay(
  findings: readonly AxleFinding[],
  tires: readonly RoundTire[],
): AxleFinding[] {
  const at = (position: AxleFinding['higher']) => tires.find((tire) => tire.position === position);
  return findings.filter(({ kind, higher, lower }) => {
    const pair = [at(higher), at(lower)].filter((tire) => tire !== undefined);
    if (pair.some((tire) => tire.fill || isForTechnician(tire))) return false;
    return kind === 'duals-differ' || !pair.some(({ verdict }) => wantsAction(verdict));
  });
}

const isForTechnician = ({ verdict }: RoundTire) =>
  verdict.kind === 'too-low' || verdict.kind === 'mate-too-low';

/** Air that five minutes of fast idle deliver, litres at 100 kPa: 4 dm³/s, a slow one. Practice. */
const fiveMinutesOfAirL = 5 * 60 * 4;
/** One hundred kPa more put a tire's own volume of air into it once. */
const kpaPerVolume = 100;

/** Five minutes of continuous pumping is enough; more is said so before the first fill. */
export function outsideCompressorWords(tires: readonly RoundTire[]): string | undefined {
  const missingL = tires
    .filter((tire) => tire.fillable && !isFilled(tire))
    .map(({ wheel, kpa }) => (wheel.volumeL * (wheel.targetKpa - (kpa ?? 0))) / kpaPerVolume)
    .reduce((sum, litres) => sum + litres, 0);
  if (missingL <= fiveMinutesOfAirL) return undefined;
  return 'This is more air than five minutes of pumping give. An outside compressor is the better tool. Otherwise let it cut out between tires.';
}
