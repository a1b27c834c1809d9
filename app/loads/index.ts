/**
 * Tires as the coach stands on them: where they sit, how much air they hold, what a cold check
 * found and how fast they lose it. Data in, data out; the words for people live with the screens.
 */
export * from './axle-differences';
export * from './check-due';
export * from './cold-check';
export * from './leak-trend';
export * from './positions';
export * from './temperature';
export * from './tire-size';
export * from './tire-volume';
