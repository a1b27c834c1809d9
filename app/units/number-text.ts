/** What came of reading typed text. The words for each problem live with the form. */
export type Parsed<Value> =
  | { ok: true; value: Value }
  | { ok: false; problem: 'empty' }
  | { ok: false; problem: 'not-a-number'; text: string }
  | { ok: false; problem: 'out-of-range'; minimum: Value; maximum: Value };

/** A typed figure with the unit it is in and the worth of half its last digit. */
export interface TypedNumber<Unit extends string> {
  number: number;
  halfDigit: number;
  unit: Unit;
}

export interface UnitName<Unit extends string> {
  unit: Unit;
  pattern: RegExp;
}

interface NumberOptions {
  /** Reads "5,280" and "5.280" as five thousand: for altitudes, which nobody types in millimetres. */
  grouping?: boolean;
}

const minusSign = '\u2212';
// A mark needs digits behind it, so that "12." and "12..5" are slips and not numbers. No
// exponent, no hex: Number() alone would read "1e3", "0x10" and "" as numbers.
const decimalText = /^([-\u2212]?)(\d*)(?:[.,](\d+))?$/;
const groupedText = /^([-\u2212]?)(\d{1,3})[.,](\d{3})$/;

/**
 * Writes a number with a fixed count of decimals, a true minus sign and never "−0".
 * @throws RangeError when `value` is not finite: an unknown is not a figure.
 */
export function formatNumber(value: number, digits: number, { trim = false, sign = false } = {}) {
  if (!Number.isFinite(value)) throw new RangeError(`number to show: ${value} is not finite`);
  const fixed = Math.abs(value).toFixed(digits);
  const size = trim && fixed.includes('.') ? fixed.replace(/\.?0+$/, '') : fixed;
  if (Number(size) === 0) return size;
  if (value < 0) return `${minusSign}${size}`;
  return sign ? `+${size}` : size;
}

/** Reads one figure and, where it is written out, its unit; `fallback` is the unit of a bare figure. */
export function parseNumberWithUnit<Unit extends string>(
  text: string,
  fallback: Unit,
  names: readonly UnitName<Unit>[],
  options: NumberOptions = {},
): Exclude<Parsed<TypedNumber<Unit>>, { problem: 'out-of-range' }> {
  const trimmed = text.trim();
  if (trimmed === '') return { ok: false, problem: 'empty' };
  const [, figure = '', suffix = ''] = /^([-\u2212\d.,]*)\s*(.*)$/s.exec(trimmed) ?? [];
  const unit = suffix === '' ? fallback : names.find((name) => name.pattern.test(suffix))?.unit;
  const parts = readFigure(figure, options);
  if (unit === undefined || parts === null) return { ok: false, problem: 'not-a-number', text };
  return { ok: true, value: { ...parts, unit } };
}

function readFigure(figure: string, { grouping = false }: NumberOptions) {
  const grouped = grouping ? groupedText.exec(figure) : null;
  const [, sign = '', whole = '', fraction = ''] = grouped
    ? [figure, grouped[1], `${grouped[2]}${grouped[3]}`]
    : (decimalText.exec(figure) ?? []);
  if (whole === '' && fraction === '') return null;
  const size = Number(`${whole || '0'}.${fraction || '0'}`);
  return { number: sign && size !== 0 ? -size : size, halfDigit: 0.5 * 10 ** -fraction.length };
}

/**
 * Turns a typed figure into the house's own unit and holds it to a range. A figure that lies
 * outside by no more than its own rounding, and never more than the rounding of the screen, counts
 * as the bound: a stored bound, shown and typed back, is not refused.
 * @param toInternal rising: from the typed unit to the unit of the bounds
 * @param shownDigits decimals that the screen shows in the typed unit
 */
export function withinRange<Value extends number>(
  { number, halfDigit }: { number: number; halfDigit: number },
  range: {
    toInternal: (figure: number) => number;
    minimum: Value;
    maximum: Value;
    shownDigits: number;
  },
): Parsed<Value> {
  const { toInternal, minimum, maximum, shownDigits } = range;
  const slack = Math.min(halfDigit, 0.5 * 10 ** -shownDigits);
  const reaches = toInternal(number - slack) <= maximum && toInternal(number + slack) >= minimum;
  if (!reaches) return { ok: false, problem: 'out-of-range', minimum, maximum };
  const value = Math.min(Math.max(toInternal(number), minimum), maximum);
  return { ok: true, value: value as Value };
}
