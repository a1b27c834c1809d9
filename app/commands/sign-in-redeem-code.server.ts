import { randomUUID } from 'node:crypto';
import { Op, QueryTypes, type Transaction } from 'sequelize';
import { sequelize } from '~/models/database.server';
import { LoginSession } from '~/models/login-session.server';
import { User } from '~/models/user.server';
import { startLoginSession } from '~/services/login-session.server';

export interface CodeToRedeem {
  challengeId: string;
  /** The address that the strategy believes; it must be the one that the code was sent to. */
  email: string;
  codeHmac: string;
  userAgent: string;
  now: Date;
}

/**
 * Uses a code up and signs its address in: makes the account at the first time and a session.
 * Returns the session's token, or null when the code does not fit the challenge or is used already;
 * then nothing is written.
 */
export async function redeemCode(code: CodeToRedeem): Promise<string | null> {
  return sequelize.transaction(async (transaction) => {
    if (!(await useUp(code, transaction))) return null;
    const userId = await accountOf(code.email, code.now, transaction);
    await forgetOldSessions(userId, code.now, transaction);
    return startLoginSession(userId, code.userAgent, code.now, transaction);
  });
}

/** One statement, so that of two browsers with the same code one is first and the other is late. */
async function useUp(code: CodeToRedeem, transaction: Transaction): Promise<boolean> {
  const rows = await sequelize.query(
    `UPDATE sign_in_challenges SET used_at = :now
     WHERE id = :challengeId AND email = :email AND code_hmac = :codeHmac
       AND used_at IS NULL AND expires_at > :now
     RETURNING id`,
    { replacements: { ...code }, type: QueryTypes.SELECT, transaction },
  );
  return rows.length === 1;
}

async function accountOf(email: string, now: Date, transaction: Transaction): Promise<string> {
  await sequelize.query(
    `INSERT INTO users (id, email, created_at) VALUES (:id, :email, :now)
     ON CONFLICT (email) DO NOTHING`,
    { replacements: { id: randomUUID(), email, now }, transaction },
  );
  const user = await User.findOne({ where: { email }, transaction, rejectOnEmpty: true });
  return user.id;
}

/** What was signed in long ago says nothing about the devices of today. */
async function forgetOldSessions(userId: string, now: Date, transaction: Transaction) {
  const before = new Date(now.getTime() - 30 * 86_400_000);
  const over = [{ expiresAt: { [Op.lt]: before } }, { endedAt: { [Op.lt]: before } }];
  await LoginSession.destroy({ where: { userId, [Op.or]: over }, transaction });
}
