import type { AirProfile } from '~/air';
import { AirProfileRow } from '~/models/air-profile.server';

/** What a profile believes of one figure: one in ten lies below `low`, one in ten above `high`. */
export interface Believed {
  low: number;
  middle: number;
  high: number;
}

/** What has been learned about a coach's supply, as people read it. Gauge kPa. */
export interface LearnedAir {
  /** How many fills have taught it. */
  fills: number;
  learnedAt: Date;
  hose: string | null;
  chuck: string | null;
  gauge: string | null;
  cutInKpa: Believed | null;
  cutOutKpa: Believed | null;
}

/** The newest air profile of a coach; null while no fill has taught one. */
export async function loadLearnedAir(coachId: string): Promise<LearnedAir | null> {
  const row = await AirProfileRow.findOne({ where: { coachId }, order: [['learnedAt', 'DESC']] });
  if (!row) return null;
  const { profile, learnedAt } = row;
  return {
    fills: profile.fills,
    learnedAt,
    hose: profile.key.hose ?? null,
    chuck: profile.key.chuck ?? null,
    gauge: profile.key.gauge ?? null,
    cutInKpa: believed(profile, 'cutInKpa'),
    cutOutKpa: believed(profile, 'cutOutKpa'),
  };
}

/** Null when the profile has no such figure: another version of the engine may name it otherwise. */
function believed({ fields, members }: AirProfile, field: string): Believed | null {
  const column = fields.indexOf(field);
  const rising = members
    .flatMap((member) => member[column] ?? [])
    .sort((left, right) => left - right);
  const at = (share: number) => rising[Math.floor(share * (rising.length - 1))];
  const [low, middle, high] = [at(0.1), at(0.5), at(0.9)];
  if (low === undefined || middle === undefined || high === undefined) return null;
  return { low, middle, high };
}
