import { User } from '~/models/user.server';
import type { PressureUnit } from '~/units';

/** Saves how somebody wants to be called and in which unit pressures are shown to them. */
export async function saveProfile(
  userId: string,
  profile: { name: string; pressureUnit: PressureUnit },
): Promise<void> {
  await User.update(profile, { where: { id: userId } });
}
