import type { EngineSpeed, FillEvent, FillSetup, LowerBy } from '~/air';

/** What the log says in so many words, without the engine: for the screen's keys and notices. */
export interface LogFacts {
  chuckOn: boolean;
  /** Seconds since the start when it went on; undefined while off. */
  chuckOnSince: number | undefined;
  /** The chuck has been on this tire at least once. */
  everOn: boolean;
  lowering: LowerBy | undefined;
  bleeding: boolean;
  engine: EngineSpeed | undefined;
  helper: boolean;
  place: 'seat' | 'wheel';
  lowAir: boolean;
}

/** Reads the log in the order of its times; what was taken back counts as never said. */
export function factsOf(events: readonly FillEvent[], setup: FillSetup): LogFacts {
  const facts: LogFacts = {
    chuckOn: false,
    chuckOnSince: undefined,
    everOn: false,
    lowering: undefined,
    bleeding: false,
    engine: undefined,
    helper: setup.crew?.helper ?? true,
    place: 'wheel',
    lowAir: false,
  };
  for (const event of standing(events)) tell(facts, event);
  return facts;
}

/** The events that still stand, by time. */
export function standing(events: readonly FillEvent[]): FillEvent[] {
  const gone = new Set<string>();
  for (const event of events) if (event.type === 'taken-back') gone.add(event.of);
  return events
    .filter((event) => event.type !== 'taken-back' && !gone.has(event.id ?? ''))
    .sort((a, b) => a.at - b.at);
}

function tell(facts: LogFacts, event: FillEvent): void {
  switch (event.type) {
    case 'chuck':
      facts.chuckOnSince = event.on ? (facts.chuckOnSince ?? event.at) : undefined;
      facts.chuckOn = event.on;
      facts.everOn ||= event.on;
      return;
    case 'lowering':
      facts.lowering = event.on ? event.by : undefined;
      return;
    case 'bleeding':
      facts.bleeding = event.on;
      return;
    case 'engine':
      facts.engine = event.speed;
      return;
    case 'crew':
      facts.helper = event.helper;
      return;
    case 'place':
      facts.place = event.where;
      return;
    case 'low-air':
      facts.lowAir = event.on;
      return;
  }
}
