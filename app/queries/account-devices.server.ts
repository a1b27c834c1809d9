import { Op } from 'sequelize';
import { LoginSession } from '~/models/login-session.server';

/** A browser on which somebody is signed in. */
export interface Device {
  id: string;
  userAgent: string;
  createdAt: Date;
  seenAt: Date;
}

/** The browsers on which `userId` is signed in now, the one seen last first. */
export async function findDevices(userId: string, now = new Date()): Promise<Device[]> {
  const rows = await LoginSession.findAll({
    where: { userId, endedAt: null, expiresAt: { [Op.gt]: now } },
    order: [
      ['seenAt', 'DESC'],
      ['createdAt', 'DESC'],
    ],
  });
  return rows.map(({ id, userAgent, createdAt, seenAt }) => ({ id, userAgent, createdAt, seenAt }));
}
