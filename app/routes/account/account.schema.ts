import { z } from 'zod';
import { pressureUnits } from '~/units';

const longestName = 80;

/** What can be shown to somebody, in the order in which it is offered. */
export const unitChoices = pressureUnits.map((unit) => ({ value: unit, label: unit }));

export const profileSchema = z.object({
  name: z
    .string('Type your name, or leave it empty.')
    .trim()
    .max(longestName, `Type a name of at most ${longestName} characters.`),
  pressureUnit: z.enum(pressureUnits, 'Choose psi, kPa or bar.'),
});

/** What the forms of the account page are for. */
export const intents = ['save', 'end-one', 'end-others'] as const;

export const intentSchema = z.object({
  intent: z.enum(intents, 'Use one of the buttons on the page.'),
});

export const endOneSchema = z.object({
  sessionId: z.uuid('Choose one of the browsers in the list.'),
});
