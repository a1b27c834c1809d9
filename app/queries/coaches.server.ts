import { QueryTypes } from 'sequelize';
import { type Actor, can, type Role } from '~/access/can';
import type { AxleLayout } from '~/loads';
import { sequelize } from '~/models/database.server';

/** A coach in the list of those that a person may see. */
export interface CoachInList {
  id: string;
  name: string;
  layout: AxleLayout;
  role: Role;
  /** When the newest round began; null when there was none. */
  lastRoundAt: Date | null;
  roundOpen: boolean;
}

/** The coaches that this person may see, by name. A helper sees one only during a round. */
export async function listCoaches(actor: Actor): Promise<CoachInList[]> {
  const coaches = await sequelize.query<CoachInList>(
    `SELECT coaches.id, name, layout, role, last.started_at AS "lastRoundAt",
       coalesce(last.open, false) AS "roundOpen"
     FROM coaches
     JOIN memberships ON coach_id = coaches.id AND user_id = :userId AND valid_until IS NULL
     LEFT JOIN LATERAL (
       SELECT max(started_at) AS started_at, bool_or(closed_at IS NULL) AS open
       FROM rounds WHERE rounds.coach_id = coaches.id
     ) AS last ON true
     WHERE deleted_at IS NULL
     ORDER BY lower(name), coaches.id`,
    { replacements: { userId: actor.userId }, type: QueryTypes.SELECT },
  );
  return coaches.filter(({ id, roundOpen }) => can(actor, 'coach:see', { id, roundOpen }));
}
