import { QueryTypes, type Transaction } from 'sequelize';
import { type Action, type Actor, can, type Role } from '~/access/can';
import { sequelize } from '~/models/database.server';
import { Membership } from '~/models/membership.server';
import { notFound, Refusal } from '~/services/refusal.server';

/** The person with the roles that are in force now. */
export async function loadActor(userId: string): Promise<Actor> {
  const rows = await Membership.findAll({ where: { userId, validUntil: null } });
  return { userId, roles: new Map<string, Role>(rows.map((row) => [row.coachId, row.role])) };
}

/**
 * Refuses unless `actor` may do `action` to the coach: 404 to those who may not know of it,
 * 403 to those who may see it but not do this.
 */
export async function requireCoach(
  actor: Actor | null,
  action: Action,
  coachId: string,
  transaction?: Transaction,
): Promise<void> {
  if (!actor?.roles.has(coachId)) throw notFound('coach');
  const coach = { id: coachId, roundOpen: await hasOpenRound(coachId, transaction) };
  if (can(actor, action, coach)) return;
  if (!can(actor, 'coach:see', coach)) throw notFound('coach');
  throw new Refusal('not-allowed', 'not-allowed', 'Your role on this coach does not allow that.');
}

async function hasOpenRound(coachId: string, transaction?: Transaction): Promise<boolean> {
  const rows = await sequelize.query(
    `SELECT 1 FROM rounds JOIN coaches ON coaches.id = coach_id AND deleted_at IS NULL
     WHERE coach_id = :coachId AND closed_at IS NULL LIMIT 1`,
    { replacements: { coachId }, type: QueryTypes.SELECT, ...(transaction ? { transaction } : {}) },
  );
  return rows.length > 0;
}
