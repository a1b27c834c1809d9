import { z } from 'zod';
import type { FillSetup } from '~/air';
import {
  above,
  between,
  exactly,
  gaugePressure,
  mostKpa,
  oneOf,
  stepKpa,
  text,
  yesNo,
} from './wire-fields';

const name = text(1, 60, 'a name of 1 to 60 letters');

const tire = exactly("the tire's part of the set-up", {
  startKpa: gaugePressure,
  targetKpa: gaugePressure,
  toleranceKpa: above(0, mostKpa, `a tolerance above 0 and up to ${mostKpa} kPa`),
  volumeL: above(0, 10_000, 'a volume above 0 and up to 10000 L'),
  limitKpa: gaugePressure.optional(),
  warm: yesNo.optional(),
  slowValve: yesNo.optional(),
}).refine(({ targetKpa, limitKpa }) => limitKpa === undefined || targetKpa <= limitKpa, {
  path: ['targetKpa'],
  error: 'a target that is not above limitKpa, in kPa',
});

const rig = exactly("the rig's part of the set-up", {
  gauge: oneOf(['at-chuck', 'above-valve', 'below-valve', 'dash-only']),
  valve: yesNo,
  stepKpa: stepKpa.optional(),
  hose: name.optional(),
  chuck: name.optional(),
  gaugeName: name.optional(),
});

const crew = exactly("the crew's part of the set-up", {
  helper: yesNo,
  walkSeconds: between(0, 600, 'a walk of 0 to 600 s').optional(),
});

/** Made and read by the engine alone, which checks what is inside. */
const enginesOwn = (what: string) => z.record(z.string(), z.unknown(), { error: what });

/** What the engine starts from, as it travels and is frozen. */
export const wireSetup = exactly('the set-up of a fill', {
  tire,
  rig: rig.optional(),
  lowerBy: z.array(oneOf(['pedal', 'drain']), { error: 'a list of pedal, drain' }).optional(),
  crew: crew.optional(),
  supply: enginesOwn('a state of the supply, made by the engine').optional(),
  atmosphereKpa: between(30, 120, "the air's own pressure of 30 to 120 kPa").optional(),
  profile: enginesOwn('an air profile, made by the engine').optional(),
  seed: between(0, 4_294_967_295, 'a number of 0 to 4294967295').int().optional(),
});

/** The same shape as the engine's own type, but for the two parts that only it can read. */
export type WireSetup = z.infer<typeof wireSetup>;

/** The parsed set-up as the engine takes it; `createFill` refuses a `supply` or `profile` not its own. */
export const toFillSetup = (setup: WireSetup): FillSetup => setup as unknown as FillSetup;
