import { QueryTypes, type Transaction } from 'sequelize';
import { sequelize } from '~/models/database.server';
import { SignInChallenge } from '~/models/sign-in-challenge.server';
import { Refusal } from '~/services/refusal.server';

/** Seconds that a code works. */
export const codeSeconds = 600;
/** Codes an hour: enough for somebody whose mail is slow, too few to flood a mailbox or to guess. */
export const codesPerAddress = 5;
export const codesPerClient = 20;

const hour = 3_600_000;
/** Stands in place of an HMAC when no code was sent. No code's HMAC is empty, so none matches. */
const notSent = '';

export interface NewChallenge {
  id: string;
  /** Lower case. */
  email: string;
  codeHmac: string;
  /** HMAC of the asking client's address. */
  client: string;
  now: Date;
}

/**
 * Records that a browser asked for a code, and says whether the code may be sent. When the address
 * has had its codes for this hour the row is written all the same, as one that no code opens: to
 * who asks, everything that follows looks alike.
 * @throws Refusal `too-many-codes` when this client has asked too often, whatever the address.
 */
export async function openChallenge(challenge: NewChallenge): Promise<{ send: boolean }> {
  const { id, email, client, now } = challenge;
  return sequelize.transaction(async (transaction) => {
    await queueUp(email, client, transaction);
    await forgetOld(now, transaction);
    await refuseBusyClient(client, now, transaction);
    const since = new Date(now.getTime() - hour);
    const [{ sent } = { sent: 0 }] = await sequelize.query<{ sent: number }>(
      `SELECT count(*)::int AS sent FROM sign_in_challenges
       WHERE email = :email AND created_at > :since AND code_hmac <> :notSent`,
      { replacements: { email, since, notSent }, type: QueryTypes.SELECT, transaction },
    );
    const send = sent < codesPerAddress;
    await SignInChallenge.create(
      {
        id,
        email,
        client,
        codeHmac: send ? challenge.codeHmac : notSent,
        createdAt: now,
        expiresAt: new Date(now.getTime() + codeSeconds * 1000),
      },
      { transaction },
    );
    return { send };
  });
}

/** Takes a code that could not be sent out of the count, and makes it useless. */
export async function markNotSent(challengeId: string): Promise<void> {
  await SignInChallenge.update({ codeHmac: notSent }, { where: { id: challengeId } });
}

/** Counts one after another for one address and one client; always in this order, so none waits in a ring. */
async function queueUp(email: string, client: string, transaction: Transaction): Promise<void> {
  for (const [kind, key] of [
    [1, email],
    [2, client],
  ] as const) {
    await sequelize.query('SELECT pg_advisory_xact_lock(:kind, hashtext(:key))', {
      replacements: { kind, key },
      transaction,
    });
  }
}

async function refuseBusyClient(client: string, now: Date, transaction: Transaction) {
  const since = new Date(now.getTime() - hour);
  const asked = await SignInChallenge.findAll({
    where: { client },
    order: [['createdAt', 'DESC']],
    limit: codesPerClient,
    transaction,
  });
  const first = asked[codesPerClient - 1];
  if (!first || first.createdAt <= since) return;
  const minutes = Math.ceil((first.createdAt.getTime() - since.getTime()) / 60_000);
  throw new Refusal(
    'too-many',
    'too-many-codes',
    `Too many codes were asked for from here. Try again in ${minutes} min.`,
  );
}

/** Nothing of a challenge is of use after an hour; some of what is a day old goes each time. */
async function forgetOld(now: Date, transaction: Transaction): Promise<void> {
  await sequelize.query(
    `DELETE FROM sign_in_challenges WHERE id IN (
       SELECT id FROM sign_in_challenges WHERE created_at < :before
       LIMIT 100 FOR UPDATE SKIP LOCKED)`,
    { replacements: { before: new Date(now.getTime() - 24 * hour) }, transaction },
  );
}
