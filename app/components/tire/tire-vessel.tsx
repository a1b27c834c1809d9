import type { PressureUnit } from '~/units';
import { tireLevels } from './tire-scale';

export interface TireVesselProps {
  /** Cold gauge pressure, kPa; undefined while not read. */
  pressureKpa?: number;
  targetKpa: number;
  unit: PressureUnit;
  /** Hatches what is missing. The caller knows the tolerance. */
  needsAir?: boolean;
}

/** One tire as a small vessel: its pressure is the level, its target the line. A picture only. */
export function TireVessel({ pressureKpa, targetKpa, unit, needsAir = false }: TireVesselProps) {
  const { line, level } = tireLevels(pressureKpa, targetKpa, unit);
  const over = level !== undefined && level > line;
  return (
    <div className="tire-vessel" data-known={level !== undefined || undefined} aria-hidden="true">
      {level !== undefined && (
        <div className="tire-level" style={{ height: `${over ? line : level}%` }} />
      )}
      {over && (
        <div className="tire-head" style={{ bottom: `${line}%`, height: `${level - line}%` }} />
      )}
      {needsAir && level !== undefined && !over && (
        <div className="tire-lack" style={{ bottom: `${level}%`, height: `${line - level}%` }} />
      )}
      <div className="tire-line" style={{ bottom: `${line}%` }} />
    </div>
  );
}
