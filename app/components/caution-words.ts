/**
 * The safety words, once, for the screens where they apply and for help. Sources stand with the
 * words in help; what has none is the practice of the trade.
 */

/** Acknowledged once a round, before the first cold reading. */
export const cautionsBefore = [
  'Level ground, wheels chocked both ways, parking brake set, transmission in neutral or park, automatic leveling off.',
  'Never reach between tire and body or under the coach while air suspension can move: it drops as air leaves.',
  'Hose, chuck and fittings sound. The coupling kicks: hold it, eyes protected. Hose and clothing clear of fan, belts and exhaust.',
  'Drain the tanks first. Blow the hose out for two seconds before the first tire.',
  'Stand to the side, never before the sidewall, face away.',
  'A bulge, a cut, exposed cord: don’t fill.',
  'Popping or crackling while filling: get away, don’t touch the chuck, call a technician.',
  'Engine running: not in a closed space.',
] as const;

/** Read before the supply is first brought down with the pedal. */
export const cautionsPedal = [
  'The licence manual warns against pushing the pedal while the spring brakes are on, since the forces can add up.',
  'Use the pedal only if the chassis manual allows it with the parking brake set.',
  'Never release the parking brake for this.',
  'Hands out of wheels and linkage while somebody pumps. Stop at the low-air warning.',
] as const;

/** Where the pedal is not allowed. */
export const cautionDrain = 'Otherwise use the supply tank’s drain.';

export const cautionsDuring = [
  'Never leave a tire with the chuck on: the supply can overfill it. When the chuck goes on, the screen shows and says a clock time: off by then even if the phone stops.',
  'Never above the pressure moulded on the sidewall or the wheel’s rating, whichever is lower.',
  'A tire at or below 80 % of its recommended pressure may have been run flat: no fill is timed for it, nor for the other tire of a dual, which carried both loads. Both are to be taken off and looked at by a technician.',
  'A warm tire reads high: never bleed it to its cold target. Warm and below the cold target: fill to the target and check again cold.',
  'Five minutes of continuous pumping is enough (practice; the maker’s word counts): let it cut out, the drier renews itself only then. For a large total an outside compressor is the better tool, and the plan says so.',
] as const;

/** A round closes only when each of these is ticked. */
export const cautionsAfter = [
  'Chuck off',
  'Caps on',
  'Hose off and stowed',
  'Fitting capped',
  'Supply back at cut-out',
  'Low-air warning out',
  'Chocks away',
] as const;

export const deference =
  'The product’s figures are an aid. The tire maker’s table, the placard, local codes and licensed technicians come first.';
