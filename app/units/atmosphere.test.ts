import fc from 'fast-check';
import psychrolib from 'psychrolib';
import { describe, expect, it } from 'vitest';
import { feet, feetToMetres, kpaPerPsi, metres, standardAtmosphere } from './index';

describe('standard atmosphere', () => {
  it.each([
    [0, 14.696],
    [1000, 14.173],
    [2000, 13.664],
    [5000, 12.228],
    [10_000, 10.106],
  ])('at %i ft is %f psi above vacuum', (altitude, wanted) => {
    // U.S. Standard Atmosphere 1976 (computed)
    const psia = standardAtmosphere(feetToMetres(feet(altitude))) / kpaPerPsi;
    expect(psia).toBeCloseTo(wanted, 3);
  });

  it('agrees with an independent library to a fifth of a pascal', () => {
    // psychrolib 1.1.1, whose constants are rounded to five figures
    psychrolib.SetUnitSystem(psychrolib.SI);
    for (let altitude = -500; altitude <= 11_000; altitude += 100) {
      const pascal = standardAtmosphere(metres(altitude)) * 1000;
      expect(Math.abs(pascal - psychrolib.GetStandardAtmPressure(altitude))).toBeLessThan(0.2);
    }
  });

  it('falls as one climbs', () => {
    const altitude = fc.integer({ min: -500, max: 10_999 });
    fc.assert(
      fc.property(altitude, (low) => {
        expect(standardAtmosphere(metres(low + 1))).toBeLessThan(standardAtmosphere(metres(low)));
      }),
    );
  });

  it.each([-501, 11_001])('refuses %i m, naming the field and the value', (altitude) => {
    expect(() => standardAtmosphere(metres(altitude))).toThrow(
      new RangeError(
        `altitude: ${altitude} m is outside -500 to 11000 m, which the standard atmosphere covers`,
      ),
    );
  });
});
