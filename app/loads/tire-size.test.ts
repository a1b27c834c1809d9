import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { estimateTireVolume, parseTireSize } from './index';

const sizeOf = (text: string) => {
  const read = parseTireSize(text);
  if (!read.ok) throw new Error(`${text}: ${read.problem}`);
  return read.size;
};
const problemOf = (text: string) => {
  const read = parseTireSize(text);
  return read.ok ? null : read.problem;
};

describe('tire sizes', () => {
  it.each([
    ['295/75R22.5', '295/75R22.5', 295, 75, 22.5],
    ['275/70R22.5', '275/70R22.5', 275, 70, 22.5],
    ['255/80R22.5', '255/80R22.5', 255, 80, 22.5],
    ['235/85R16', '235/85R16', 235, 85, 16],
    [' 295 / 75 r 22,5 ', '295/75R22.5', 295, 75, 22.5],
    ['295/75R22.5 144/141L (G) TL', '295/75R22.5', 295, 75, 22.5],
    ['315/80R22.5 LR L 20PR', '315/80R22.5', 315, 80, 22.5],
    ['225/70R19.5/G', '225/70R19.5', 225, 70, 19.5],
    ['LT235/85R16E', 'LT235/85R16', 235, 85, 16],
    ['lt 235/85 R16 load range E', 'LT235/85R16', 235, 85, 16],
    ['ST235/80R16', 'ST235/80R16', 235, 80, 16],
    ['245/70-19.5', '245/70-19.5', 245, 70, 19.5],
  ])('%j is metric', (text, code, sectionWidthMm, aspectPercent, rimDiameterIn) => {
    expect(sizeOf(text)).toMatchObject({
      code,
      sectionWidthMm,
      aspectPercent,
      aspectAssumed: false,
      rimDiameterIn,
    });
  });

  it.each([
    ['11R22.5', '11R22.5', 279.4, 22.5, 'radial'],
    ['12r22.5 H', '12R22.5', 304.8, 22.5, 'radial'],
    ['8R19.5', '8R19.5', 203.2, 19.5, 'radial'],
    ['7.50-16', '7.50-16', 207.6, 16, 'diagonal'],
    ['7.50R16LT/E', '7.50R16', 207.6, 16, 'radial'],
    ['10.00 R 20', '10.00R20', 276.9, 20, 'radial'],
  ])('%j is in inches, its aspect assumed', (text, code, width, rimDiameterIn, construction) => {
    const size = sizeOf(text);
    expect(size).toMatchObject({ code, rimDiameterIn, construction, aspectAssumed: true });
    expect(size.sectionWidthMm).toBeCloseTo(width, 1);
  });

  it.each([
    ['', 'empty'],
    ['   ', 'empty'],
    ['big ones', 'not-a-size'],
    ['295/75', 'not-a-size'],
    ['29575R22.5', 'not-a-size'],
    ['295/75R', 'not-a-size'],
    ['37x12.50R17LT', 'diameter-first'],
    ['29/75R22.5', 'width-implausible'],
    ['2955/75R22.5', 'width-implausible'],
    ['295/7R22.5', 'aspect-implausible'],
    ['295/755R22.5', 'aspect-implausible'],
    ['295/75R225', 'rim-implausible'],
    ['295/75R2', 'rim-implausible'],
    ['295/75R22.5 heavy', 'suffix-unknown'],
    ['295/75R22.5.', 'suffix-unknown'],
  ])('%j is not readable: %s', (text, problem) => {
    expect(problemOf(text)).toBe(problem);
  });

  it('are written in one spelling that reads back as the same size', () => {
    const metric = fc
      .tuple(
        fc.constantFrom('', 'LT', 'ST'),
        fc.integer({ min: 125, max: 500 }),
        fc.integer({ min: 25, max: 100 }),
        fc.constantFrom('R', '-', 'D'),
        fc.constantFrom(16, 17.5, 19.5, 20, 22.5, 24.5),
      )
      .map(([prefix, width, aspect, mark, rim]) => `${prefix}${width}/${aspect}${mark}${rim}`);
    fc.assert(
      fc.property(metric, fc.constantFrom('', ' ', '  '), (code, gap) => {
        const loose = `${gap}${code.toLowerCase().replace('/', `${gap}/${gap}`)}${gap}`;
        expect(sizeOf(loose)).toEqual(sizeOf(code));
        expect(sizeOf(code).code).toBe(code);
      }),
    );
  });

  it('never throw, whatever is typed', () => {
    fc.assert(fc.property(fc.string(), (text) => typeof parseTireSize(text).ok === 'boolean'));
  });
});

describe('air volume from the size', () => {
  it('follows the outer-envelope formula', () => {
    // TRA Design Guide 3-24R2 (2004): 3.14·(H + Dr)·(S·H) in³; the share 70 to 85 % from memory.
    // 295/75R22.5: S 11.614 in, H 8.711 in; 3.14 × 31.211 × 101.17 = 9915 in³ = 162.5 L.
    expect(estimateTireVolume('295/75R22.5')).toEqual({ volumeL: 126, lowL: 114, highL: 138 });
  });

  it.each([
    '295/75R22.5',
    '275/70R22.5',
    '255/80R22.5',
    '11R22.5',
    '12R22.5',
    '295/80R22.5',
    '315/80R22.5',
    '365/70R22.5',
    '10.00R20',
    '275/80R22.5',
    '9R22.5',
    '245/75R22.5',
  ])('puts a heavy coach’s %s between 70 and 210 L', (code) => {
    const volume = estimateTireVolume(code);
    expect(volume?.lowL).toBeGreaterThanOrEqual(70);
    expect(volume?.highL).toBeLessThanOrEqual(210);
  });

  it.each(['7.50-16', '235/85R16', '8R19.5', '225/70R19.5'])(
    'puts a light coach’s %s below',
    (code) => {
      const volume = estimateTireVolume(code);
      expect(volume?.lowL).toBeGreaterThan(40);
      expect(volume?.highL).toBeLessThan(90);
    },
  );

  it('is not made up for a size that cannot be read', () => {
    expect(estimateTireVolume('the usual')).toBeNull();
  });

  it('grows with width, aspect and rim', () => {
    const size = sizeOf('295/75R22.5');
    const volume = estimateTireVolume(size)?.volumeL ?? 0;
    for (const larger of [{ sectionWidthMm: 315 }, { aspectPercent: 80 }, { rimDiameterIn: 24.5 }])
      expect(estimateTireVolume({ ...size, ...larger })?.volumeL).toBeGreaterThan(volume);
  });
});
