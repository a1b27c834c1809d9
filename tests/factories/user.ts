import { randomUUID } from 'node:crypto';
import { User } from '~/models/user.server';
import { startLoginSession } from '~/services/login-session.server';
import { writeSessionToken } from '~/services/sign-in-cookies.server';
import type { PressureUnit } from '~/units';

export interface NewUser {
  email?: string;
  name?: string;
  pressureUnit?: PressureUnit;
}

/** Somebody with an address of their own, unless one is given. */
export async function createUser({ email, name = '', pressureUnit = 'psi' }: NewUser = {}) {
  const id = randomUUID();
  const address = (email ?? `somebody-${id}@mail.example`).toLowerCase();
  await User.create({ id, email: address, name, pressureUnit });
  return { id, email: address, name, pressureUnit };
}

/** Signs somebody in on a new browser; answers the value of its `Cookie` header. */
export async function createLoginSession(userId: string, userAgent = ''): Promise<string> {
  const token = await startLoginSession(userId, userAgent, new Date());
  const [cookie = ''] = (await writeSessionToken(token)).split(';', 1);
  return cookie;
}
