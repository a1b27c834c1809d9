import type { Advice, FillSetup, Spread } from '~/air';
import { formatPressure, gaugeKpa, type PressureUnit } from '~/units';

/** A mark on the vessel's wall. */
export interface VesselMark {
  kind: 'target' | 'cut-in' | 'cut-out' | 'limit';
  /** Height, percent of the vessel. */
  height: number;
  text: string;
}

/** The live vessel: all heights are percent of the vessel, from its bottom. */
export interface VesselState {
  /** The supply is solid up to `low` and fades out at `high`: the 80 % band of the estimate. */
  supply: { low: number; middle: number; high: number; text: string };
  tire: { height: number; text: string };
  /** The supply stands above the tire. */
  above: boolean;
  /** False while it is only being looked for: no headroom is drawn, and nothing missing. */
  known: boolean;
  marks: readonly VesselMark[];
  /** The picture in words, for a screen reader that asks. */
  words: string;
}

/** Room beyond the outermost level, and the grid on which the scale's ends lie, kPa. */
const roomKpa = 35;
const gridKpa = 35;
/** A governor value whose 80 % band is wider than this is not known well enough to be drawn. */
const knownBandKpa = 70;
/** The usual swing, 90 to 120 psi, in kPa: common practice. */
const usualCutInKpa = 620;
const usualCutOutKpa = 830;

/** What a vessel is drawn from: an estimate, or the truth of a simulated coach. */
export interface VesselFigures {
  supplyKpa: Spread;
  tireKpa: number;
  cutInKpa?: Spread;
  cutOutKpa?: Spread;
  /** False while the supply is only being looked for. */
  known: boolean;
}

/** The vessel of one advice. */
export function vesselOf(advice: Advice, setup: FillSetup, unit: PressureUnit): VesselState {
  const { supplyKpa, cutInKpa, cutOutKpa } = advice;
  const known = advice.call !== 'read-supply';
  const tireKpa = advice.tireKpa.p50;
  return drawVessel({ supplyKpa, tireKpa, cutInKpa, cutOutKpa, known }, setup.tire, unit);
}

/** Draws supply, tire, target and governor on a scale that rarely changes during a fill. */
export function drawVessel(
  figures: VesselFigures,
  tire: FillSetup['tire'],
  unit: PressureUnit,
): VesselState {
  const { supplyKpa, tireKpa, known } = figures;
  const scale = scaleOf(figures, tire);
  const height = (kpa: number) =>
    Math.min(100, Math.max(0, ((kpa - scale.low) / (scale.high - scale.low)) * 100));
  const supplyText = known ? whole(supplyKpa.p50, unit) : '?';
  const tireText = formatPressure(gaugeKpa(tireKpa), unit, { withUnit: false });
  return {
    supply: {
      low: height(supplyKpa.p10),
      middle: height(supplyKpa.p50),
      high: height(supplyKpa.p90),
      text: supplyText,
    },
    tire: { height: height(tireKpa), text: tireText },
    above: supplyKpa.p50 > tireKpa,
    known,
    marks: marksOf(figures, tire, unit).map(({ kpa, ...mark }) => ({
      ...mark,
      height: height(kpa),
    })),
    words: `Supply ${known ? `${supplyText} ${unit}` : 'not known'}, tire ${tireText} ${unit}.`,
  };
}

function scaleOf({ cutInKpa, cutOutKpa }: VesselFigures, tire: FillSetup['tire']) {
  const lows = [tire.startKpa, tire.targetKpa, cutInKpa?.p50 ?? usualCutInKpa];
  const highs = [tire.startKpa, tire.targetKpa, cutOutKpa?.p50 ?? usualCutOutKpa];
  return {
    low: Math.max(0, Math.floor((Math.min(...lows) - roomKpa) / gridKpa) * gridKpa),
    high: Math.ceil((Math.max(...highs) + roomKpa) / gridKpa) * gridKpa,
  };
}

function marksOf(figures: VesselFigures, tire: FillSetup['tire'], unit: PressureUnit) {
  const marks: { kind: VesselMark['kind']; kpa: number; text: string }[] = [
    { kind: 'target', kpa: tire.targetKpa, text: `target ${exact(tire.targetKpa, unit)}` },
  ];
  const cutOut = known(figures.cutOutKpa);
  if (cutOut) marks.push({ kind: 'cut-out', kpa: cutOut, text: `cut-out ${whole(cutOut, unit)}` });
  const cutIn = known(figures.cutInKpa);
  if (cutIn) marks.push({ kind: 'cut-in', kpa: cutIn, text: `cut-in ${whole(cutIn, unit)}` });
  if (tire.limitKpa !== undefined) {
    const text = `limit ${exact(tire.limitKpa, unit)}`;
    marks.push({ kind: 'limit', kpa: tire.limitKpa, text });
  }
  return marks;
}

function known(spread: Spread | undefined): number | undefined {
  return spread && spread.p90 - spread.p10 <= knownBandKpa ? spread.p50 : undefined;
}

const wholeDigits: Record<PressureUnit, number> = { psi: 0, kPa: 0, bar: 1 };

/** A pressure as coarse as an estimate is. */
export function whole(kpa: number, unit: PressureUnit): string {
  return formatPressure(gaugeKpa(kpa), unit, { withUnit: false, digits: wholeDigits[unit] });
}

function exact(kpa: number, unit: PressureUnit): string {
  return formatPressure(gaugeKpa(kpa), unit, { withUnit: false, trim: true });
}
