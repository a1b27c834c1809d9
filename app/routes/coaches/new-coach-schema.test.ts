import { describe, expect, it } from 'vitest';
import { kpaPerPsi } from '~/units';
import type { FormValues } from './form/read-form';
import { readNewCoach } from './new-coach-schema';

const axle = (name: string) => ({
  [`${name}.target`]: '92',
  [`${name}.size`]: '295/75R22.5',
  [`${name}.sidewallLimit`]: '120',
  [`${name}.wheelLimit`]: '125',
  [`${name}.volume`]: '',
});

const whole: FormValues = {
  name: ' Late Heron ',
  layout: 'two-axles',
  ...axle('steer'),
  ...axle('drive'),
};

function problems(changed: FormValues, unit: 'psi' | 'kPa' = 'psi') {
  const read = readNewCoach({ ...whole, ...changed }, unit);
  return read.ok ? {} : Object.fromEntries(read.answer.problems.map((p) => [p.name, p.message]));
}

describe('the first form of a coach', () => {
  it('reads two axles, and leaves out the tag axle that was not asked for', () => {
    const read = readNewCoach({ ...whole, 'tag.size': 'nonsense' }, 'psi');
    expect(read.ok && read.data.name).toBe('Late Heron');
    expect(read.ok && Object.keys(read.data.axles)).toEqual(['steer', 'drive']);
    expect(read.ok && read.data.axles.steer.targetKpa).toBeCloseTo(92 * kpaPerPsi, 9);
  });

  it('wants the tag axle when the coach has one', () => {
    expect(Object.keys(problems({ layout: 'with-tag' }))).toEqual([
      'tag.size',
      'tag.sidewallLimit',
      'tag.wheelLimit',
      'tag.target',
    ]);
  });

  it.each([
    ['', 'Type the target cold pressure, for example 112 psi.'],
    ['12..5', '“12..5” is not a figure. Type the target cold pressure, for example 112 psi.'],
    ['1O5', '“1O5” is not a figure. Type the target cold pressure, for example 112 psi.'],
    ['5', 'Type the target cold pressure between 14.5 psi and 203.1 psi.'],
    ['110 ', undefined],
    ['7,6 bar', undefined],
  ])('a target typed as "%s" is answered with %s', (target, message) => {
    expect(problems({ 'steer.target': target })['steer.target']).toBe(message);
  });

  it('names bounds in the person’s own unit', () => {
    const metric = {
      'drive.target': '640',
      'steer.sidewallLimit': '830',
      'steer.wheelLimit': '850',
    };
    expect(problems({ ...metric, 'steer.target': '9000' }, 'kPa')['steer.target']).toBe(
      'Type the target cold pressure between 100 kPa and 1400 kPa.',
    );
  });

  it('asks again for a size that cannot be read, and takes any beside a volume', () => {
    const size = { 'steer.size': '37x12.50R17' };
    expect(problems(size)).toEqual({
      'steer.size':
        'A size that begins with the diameter gives no volume. Type the volume of air too.',
    });
    const read = readNewCoach({ ...whole, ...size, 'steer.volume': '92,5 L' }, 'psi');
    expect(read.ok && read.data.axles.steer).toMatchObject({
      size: '37x12.50R17',
      volumeL: 92.5,
      volumeSource: 'typed',
    });
  });

  it('sends back what was typed', () => {
    const read = readNewCoach({ ...whole, name: '' }, 'psi');
    expect(read.ok ? null : read.answer.values).toEqual({ ...whole, name: '' });
  });
});
