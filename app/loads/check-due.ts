/**
 * Days between two cold checks. Trade press: a truck tire loses about 2 %, or 1 to 3 psi, a month;
 * after a month a tire at target is still within a common tolerance of 2 to 3 psi.
 */
export const checkPeriodDays = 30;

const dayMs = 24 * 60 * 60 * 1000;

/**
 * When the next cold check is due: whole days after the last one, at the same time of day (UTC).
 * @param lastAt null when there has been none: then nothing is known, and the answer is null
 * @param periodDays above 0
 * @throws RangeError naming the field and the value.
 */
export function nextCheckDue(lastAt: Date | null, periodDays = checkPeriodDays): Date | null {
  if (!(periodDays > 0 && Number.isFinite(periodDays)))
    throw new RangeError(`periodDays: ${periodDays} is not above 0`);
  if (lastAt === null) return null;
  if (Number.isNaN(lastAt.getTime())) throw new RangeError('lastAt: not a date');
  return new Date(lastAt.getTime() + periodDays * dayMs);
}
