import type { Reason } from '~/air';

/** Figures that a line of words may quote, as the person reads them. */
export interface WhyFigures {
  target: string;
  tire: string;
  /** With `cannot-reach`: the most that this supply can give. */
  reach: string | undefined;
  /** The air path is opened and closed by a shut-off valve. */
  valve: boolean;
}

export interface ReasonWords {
  /** The call itself, where the reason knows it better than the call: one to three words. */
  title?: string;
  /** One line of why, for the panel. */
  why: string | ((figures: WhyFigures) => string);
  /** What to do about it: for `check` and `cannot-reach`. */
  next?: string;
}

/** Words for every reason of the engine. A reason without words does not compile. */
export const reasonWords: Record<Reason, ReasonWords> = {
  'supply-unknown': { why: 'Tap what it shows.' },
  'supply-unsure': { why: 'Tap what it shows now.' },
  'supply-below-tire': { why: 'On now would let air out.' },
  'supply-about-to-fall': { why: 'The supply is about to fall.' },
  'wait-for-cut-in': { why: 'The supply has to fall to cut-in.' },
  'engine-off': { why: 'The engine has to run first.' },
  'let-it-settle': { why: 'Let the tire settle.' },
  'not-at-the-wheel': { why: 'Walk back to the wheel first.' },
  'after-low-air': { why: 'Let the supply build up first.' },
  'lower-to-cut-in': { why: 'At cut-in the compressor starts.' },
  'cut-in-likely': { why: 'The compressor should run now.' },
  'low-enough': { why: 'That is low enough.' },
  'supply-too-low': { why: 'The supply is low. Leave it there.' },
  'chuck-is-on': { why: 'The chuck is on this tire.' },
  'supply-above-tire': { why: 'Supply is above this tire.' },
  'air-goes-in': { why: 'Air is going in.' },
  'target-reached': { why: ({ target }) => `It should be at ${target} now.` },
  'gauge-to-be-sure': { why: 'Then gauge it, to be sure.' },
  'supply-at-tire': { why: 'Supply is down to this tire.' },
  'near-limit': { why: 'The limit is near.' },
  'cycle-again': { why: 'It has to build up again.' },
  'prove-it': { why: 'Type what the tire reads.' },
  'reading-odd': { why: 'That reading was odd. Read it again.' },
  'see-what-went-in': { why: 'See how much went in.' },
  'over-target': { why: ({ target }) => `Let a little out, down to ${target}.` },
  'in-tolerance': { why: ({ tire }) => `It is at ${tire}, within tolerance.` },
  'warm-over-target': { why: 'It is warm and reads high. Don’t bleed it. Check it again cold.' },
  'governor-too-low': {
    why: ({ reach, target }) =>
      reach ? `This supply gives ${reach} at most.` : `This supply does not reach ${target}.`,
    next: 'Fill the rest from an outside compressor, or have a shop do it.',
  },
  'supply-not-moving': {
    title: 'Check the hose',
    why: 'The supply does not move.',
    next: 'Open every valve on the hose. Then read the gauge again.',
  },
  'compressor-not-loading': {
    title: 'Check the engine',
    why: 'Below cut-in, and it does not build.',
    next: 'Set fast idle. If it still does not build, have the governor looked at.',
  },
  'not-building': {
    title: 'Check the supply',
    why: 'The supply does not build.',
    next: 'Set fast idle and listen for a leak. Close the drains.',
  },
  'gauges-disagree': {
    title: 'Check the gauges',
    why: 'The two gauges disagree.',
    next: 'Read both again. Trust the one at the wheel.',
  },
  'tire-not-rising': {
    title: 'Seat it again',
    why: 'The tire does not rise.',
    next: 'Press the chuck on squarely. See that the hose valve is open.',
  },
  'chuck-still-on': {
    title: 'Look at it',
    why: 'Is the chuck still on?',
    next: 'Tap what is so.',
  },
  'low-air': {
    title: 'Low air',
    why: 'The low-air warning is on.',
    next: 'Take the chuck off. Stop lowering. Let the supply build up.',
  },
};

/** The reason's line, with the wording of a shut-off valve where the rig has one. */
export function whyOf(reason: Reason, figures: WhyFigures): string {
  const { why } = reasonWords[reason];
  const text = typeof why === 'string' ? why : why(figures);
  return figures.valve ? withValve(text) : text;
}

/** The next step of a reason, if it has one. */
export function nextOf(reason: Reason, valve: boolean): string | undefined {
  const { next } = reasonWords[reason];
  return next && valve ? withValve(next) : next;
}

const valveWords: readonly (readonly [string, string])[] = [
  ['On now', 'Open now'],
  ['The chuck is on this tire', 'The valve is open'],
  ['Is the chuck still on', 'Is the valve still open'],
  ['Take the chuck off', 'Close the valve'],
];

function withValve(text: string): string {
  return valveWords.reduce((words, [chuck, valve]) => words.replace(chuck, valve), text);
}
