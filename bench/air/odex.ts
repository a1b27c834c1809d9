import { createRequire } from 'node:module';

/** The part of the package `odex` that is used here. */
export interface OdexSolver {
  relativeTolerance: number;
  absoluteTolerance: number;
  solve(
    slopes: (x: number, y: number[]) => number[],
    x: number,
    y0: number[],
    xEnd: number,
  ): { y: number[] };
}

/**
 * Required and not imported: the package's types are its TypeScript source, which the compiler
 * would hold to this project's strictness.
 */
export const { Solver } = createRequire(import.meta.url)('odex') as {
  Solver: new (dimension: number) => OdexSolver;
};
