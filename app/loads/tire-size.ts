/** A tire's size as its sidewall says it, in the units of the code. */
export interface TireSize {
  /** The code in one spelling: "295/75R22.5", "LT235/85R16", "7.50-16". */
  code: string;
  prefix: 'P' | 'LT' | 'ST' | null;
  sectionWidthMm: number;
  /** Section height in per cent of section width. */
  aspectPercent: number;
  /** A code in inches says no aspect; it is then the usual one of its kind. */
  aspectAssumed: boolean;
  rimDiameterIn: number;
  construction: 'radial' | 'diagonal' | 'belted';
}

/** Why a size could not be read. The words live with the form. */
export type TireSizeProblem =
  | 'empty'
  | 'not-a-size'
  | 'diameter-first'
  | 'width-implausible'
  | 'aspect-implausible'
  | 'rim-implausible'
  | 'suffix-unknown';

export type ParsedTireSize =
  | { ok: true; size: TireSize }
  | { ok: false; problem: TireSizeProblem; text: string };

const mmPerInch = 25.4;

// A truck tire of the 15°-drop-centre family (rims that end in .5) is as wide as its code says and
// about 0.87 as high as wide. An older code with a full-inch rim names a width that the tire
// exceeds by about 9 %, and such a tire is about 0.96 as high as wide. Both from memory of trade
// size tables; the estimate's own spread of volume is wider.
const dropCentre = { widthFactor: 1, aspectPercent: 87 };
const fullInch = { widthFactor: 1.09, aspectPercent: 96 };

// From light trucks to wide singles; outside of these a digit is missing or doubled.
const plausible = {
  widthMm: { least: 125, most: 500 },
  aspectPercent: { least: 25, most: 100 },
  rimIn: { least: 12, most: 26 },
};

const constructions = { R: 'radial', '-': 'diagonal', D: 'diagonal', B: 'belted' } as const;

const metricCode = /^(P|LT|ST)?(\d+)\/(\d+)Z?([RDB-])(\d+(?:\.\d+)?)(.*)$/;
const inchCode = /^(LT|ST)?(\d{1,2}(?:\.\d{1,2})?)([RDB-])(\d+(?:\.\d+)?)(.*)$/;
const diameterFirstCode = /^(LT)?\d{2}(?:\.\d+)?X\d/;

// What may stand behind the size, in any order: use, load range, ply rating, load index with speed
// letter, tubeless or tube type. It is recognised, so that a slip is not, and then left alone.
const knownSuffix =
  /^(?:[\s/()]*(?:LT|ST|TR|MH|C|TL|TT|(?:LR|LOAD RANGE)?\s?[A-N]|\d{1,2}\s?PR|\d{2,3}(?:\/\d{2,3})?\s?[A-Y]?)(?![A-Z0-9]))*[\s/()]*$/;

/**
 * Reads a tire size: metric ("295/75R22.5", "LT235/85R16/E") or in inches ("11R22.5", "7.50-16").
 * Spaces, case, a decimal comma and load suffixes are tolerated. Sizes that begin with the overall
 * diameter ("37x12.50R17") are told apart but not read.
 */
export function parseTireSize(text: string): ParsedTireSize {
  const tidy = text.trim().toUpperCase().replaceAll(',', '.').replaceAll('\u2013', '-');
  if (tidy === '') return { ok: false, problem: 'empty', text };
  const code = tidy.replace(/\s*([/RDBX-])\s*(?=\d)/g, '$1').replace(/^(P|LT|ST)\s+/, '$1');
  const read = readMetric(code) ?? readInches(code);
  if (read === null) {
    const problem = diameterFirstCode.test(code) ? 'diameter-first' : 'not-a-size';
    return { ok: false, problem, text };
  }
  const problem = findImplausible(read.size);
  if (problem !== null) return { ok: false, problem, text };
  if (!knownSuffix.test(read.suffix)) return { ok: false, problem: 'suffix-unknown', text };
  return { ok: true, size: read.size };
}

type SizeAndSuffix = { size: TireSize; suffix: string };

function readMetric(code: string): SizeAndSuffix | null {
  const match = metricCode.exec(code);
  if (match === null) return null;
  const [, prefix, width = '', aspect = '', mark = '', rim = '', suffix = ''] = match;
  return {
    size: {
      code: `${prefix ?? ''}${width}/${aspect}${mark}${rim}`,
      prefix: prefixOf(prefix),
      sectionWidthMm: Number(width),
      aspectPercent: Number(aspect),
      aspectAssumed: false,
      rimDiameterIn: Number(rim),
      construction: constructionOf(mark),
    },
    suffix,
  };
}

function readInches(code: string): SizeAndSuffix | null {
  const match = inchCode.exec(code);
  if (match === null) return null;
  const [, prefix, width = '', mark = '', rim = '', suffix = ''] = match;
  const family = rim.endsWith('.5') ? dropCentre : fullInch;
  return {
    size: {
      code: `${prefix ?? ''}${width}${mark}${rim}`,
      prefix: prefixOf(prefix),
      sectionWidthMm: Number(width) * family.widthFactor * mmPerInch,
      aspectPercent: family.aspectPercent,
      aspectAssumed: true,
      rimDiameterIn: Number(rim),
      construction: constructionOf(mark),
    },
    suffix,
  };
}

const prefixOf = (text: string | undefined): TireSize['prefix'] =>
  text === 'P' || text === 'LT' || text === 'ST' ? text : null;

const constructionOf = (mark: string): TireSize['construction'] =>
  mark === 'R' || mark === 'B' || mark === 'D' ? constructions[mark] : constructions['-'];

function findImplausible(size: TireSize): TireSizeProblem | null {
  const { widthMm, aspectPercent, rimIn } = plausible;
  const outside = (value: number, range: { least: number; most: number }) =>
    value < range.least || value > range.most;
  if (outside(size.sectionWidthMm, widthMm)) return 'width-implausible';
  if (outside(size.aspectPercent, aspectPercent)) return 'aspect-implausible';
  if (outside(size.rimDiameterIn, rimIn)) return 'rim-implausible';
  return null;
}
