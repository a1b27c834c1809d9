import { Op } from 'sequelize';
import { LoginSession } from '~/models/login-session.server';

/** Which browsers of one person: one of them, or all but one. */
export type WhichSessions = { only: string } | { allBut: string };

/**
 * Signs browsers of `userId` out, at once: their next request finds no session. Ending one twice,
 * or one of somebody else, changes nothing. Returns how many were ended.
 */
export async function endLoginSessions(
  userId: string,
  which: WhichSessions,
  now = new Date(),
): Promise<number> {
  const id = 'only' in which ? which.only : { [Op.ne]: which.allBut };
  const [ended] = await LoginSession.update(
    { endedAt: now },
    { where: { userId, id, endedAt: null } },
  );
  return ended;
}
