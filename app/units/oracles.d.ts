/** The parts of two untyped libraries that tests use as independent oracles. */
declare module 'unitmath' {
  interface Unit {
    to(target: string): Unit;
    readonly value: number;
  }
  export default function unit(value: number, unit: string): Unit;
}

declare module 'psychrolib' {
  const psychrolib: {
    readonly SI: number;
    SetUnitSystem(system: number): void;
    /** @returns Pa */
    GetStandardAtmPressure(altitudeM: number): number;
  };
  export default psychrolib;
}
