import { type Litres, litres, litresPerCubicInch } from '~/units';
import { parseTireSize, type TireSize } from './tire-size';

export interface TireVolumeEstimate {
  /** The middle of the range, to the nearest litre. */
  volumeL: Litres;
  lowL: Litres;
  highL: Litres;
}

const mmPerInch = 25.4;
/** Share of the outer envelope that is air; tread, casing and rim take the rest. From memory. */
const airShare = { low: 0.7, high: 0.85 };
/** The formula's own figure for pi: the outer envelope is a rectangle turned round the axle. */
const formulaPi = 3.14;

/**
 * Estimates the air volume of a tire from its size, in litres.
 * @param size a size, or a code as typed
 * @returns null when the code cannot be read: then the person is asked.
 * Source: TRA Design Guide 3-24R2 (2004), outer envelope in³ = 3.14·(H + Dr)·(S·H), of which the
 * air is about 70 to 85 % (share from memory).
 */
export function estimateTireVolume(size: TireSize | string): TireVolumeEstimate | null {
  if (typeof size === 'string') {
    const read = parseTireSize(size);
    return read.ok ? estimateTireVolume(read.size) : null;
  }
  const section = size.sectionWidthMm / mmPerInch;
  const height = (section * size.aspectPercent) / 100;
  const cubicInches = formulaPi * (height + size.rimDiameterIn) * (section * height);
  const part = (share: number) => litres(Math.round(cubicInches * litresPerCubicInch * share));
  return {
    volumeL: part((airShare.low + airShare.high) / 2),
    lowL: part(airShare.low),
    highL: part(airShare.high),
  };
}
