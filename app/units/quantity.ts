declare const unit: unique symbol;

/**
 * A number that carries its unit in its type. At run time it is a plain number; two quantities
 * of different units don't assign to each other.
 */
export type Quantity<Unit extends string> = number & { readonly [unit]: Unit };

/**
 * Brands a number after checking it.
 * @throws RangeError naming the quantity and the value when it is not finite or below `least`.
 */
export function quantity<Unit extends string>(
  name: string,
  value: number,
  least = Number.NEGATIVE_INFINITY,
): Quantity<Unit> {
  if (!Number.isFinite(value)) throw new RangeError(`${name}: ${value} is not a finite number`);
  if (value < least) throw new RangeError(`${name}: ${value} is below ${least}`);
  return value as Quantity<Unit>;
}
