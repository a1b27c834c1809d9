import { formatNumber, type Parsed, parseNumberWithUnit, withinRange } from './number-text';
import { type Quantity, quantity } from './quantity';

/** The house's own unit of volume. */
export type Litres = Quantity<'L'>;

/** 2.54 cm cubed, exact. NIST SP 811. */
export const litresPerCubicInch = 0.016387064;

/** Wider than any road tire, so that a slip of the finger is caught and a real tire is not. */
const typedVolume = { minimum: 1 as Litres, maximum: 1000 as Litres };

/** @throws RangeError when `value` is not finite or below 0. */
export const litres = (value: number): Litres => quantity('volume in L', value, 0);

/** `"148 L"`; whole litres unless `digits` says otherwise. */
export function formatVolume(
  value: Litres,
  { digits = 0, withUnit = true }: { digits?: number; withUnit?: boolean } = {},
): string {
  const figure = formatNumber(value, digits);
  return withUnit ? `${figure} L` : figure;
}

/** Reads a tire's volume in litres, 1 to 1000, with a decimal point or comma. */
export function parseVolume(text: string): Parsed<Litres> {
  const typed = parseNumberWithUnit(text, 'L', [{ unit: 'L', pattern: /^l(itres?|iters?)?$/i }]);
  if (!typed.ok) return typed;
  return withinRange(typed.value, {
    toInternal: (figure) => figure,
    ...typedVolume,
    shownDigits: 0,
  });
}
