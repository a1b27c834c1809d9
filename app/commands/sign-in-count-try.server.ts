import { QueryTypes } from 'sequelize';
import { sequelize } from '~/models/database.server';

/** Codes that may be typed against one challenge. */
export const triesPerCode = 5;

/**
 * Counts one try against a challenge, before anything looks at the code. Returns how many are left
 * after this one, or null when none was left, or the challenge is used, has run out or is unknown.
 */
export async function countTry(challengeId: string, now: Date): Promise<number | null> {
  const [row] = await sequelize.query<{ tries: number }>(
    `UPDATE sign_in_challenges SET tries = tries + 1
     WHERE id = :challengeId AND tries < :triesPerCode AND used_at IS NULL AND expires_at > :now
     RETURNING tries`,
    { replacements: { challengeId, triesPerCode, now }, type: QueryTypes.SELECT },
  );
  return row ? triesPerCode - row.tries : null;
}
