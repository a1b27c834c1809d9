import { type Actor, can } from '~/access/can';
import { loadFitting } from '~/queries/coach.server';
import { loadRound } from '~/queries/round.server';
import type { Viewer } from '~/services/viewer.server';
import type { RoundPageData } from './round-data';

/**
 * A round's page for this person.
 * @throws Refusal `round-not-found`
 */
export async function loadRoundPage(
  { actor, pressureUnit }: Pick<Viewer, 'actor' | 'pressureUnit'>,
  roundId: string,
): Promise<RoundPageData> {
  const page = await loadRound(actor, roundId);
  const { id } = page.coach;
  return {
    ...page,
    fitting: await loadFitting(id),
    mayEdit: mayEdit(actor, id),
    unit: pressureUnit,
  };
}

const mayEdit = (actor: Actor, id: string) => can(actor, 'records:edit', { id, roundOpen: true });
