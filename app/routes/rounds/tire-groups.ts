import { type AxleLayout, walkOrderOf } from '~/loads';
import type { RoundTire } from './round-data';

/** Tires that want the same thing, in the order in which one walks round. */
export interface TireGroup {
  title: string;
  group: RoundTire[];
}

const titles = ['Do not fill', 'Fill up', 'Let down', 'Not read', 'Leave as they are'] as const;

/** Sorts the tires of a result by what they need; what is dangerous comes first. */
export function groupsOf(tires: readonly RoundTire[], layout: AxleLayout): TireGroup[] {
  const walk = walkOrderOf(layout);
  const walked = [...tires].sort((a, b) => walk.indexOf(a.position) - walk.indexOf(b.position));
  return titles
    .map((title) => ({ title, group: walked.filter((tire) => titleOf(tire) === title) }))
    .filter(({ group }) => group.length > 0);
}

function titleOf({ verdict }: RoundTire): (typeof titles)[number] {
  switch (verdict.kind) {
    case 'too-low':
    case 'mate-too-low':
      return 'Do not fill';
    case 'needs-air':
      return 'Fill up';
    case 'warm':
      return verdict.belowTarget ? 'Fill up' : 'Leave as they are';
    case 'over':
      return 'Let down';
    case 'not-read':
      return 'Not read';
    case 'in-tolerance':
      return 'Leave as they are';
  }
}
