import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { formatPressure, gaugeKpa, type PressureUnit } from '~/units';
import { scaleWords } from './tire-scale';
import { TireVessel } from './tire-vessel';

export interface DrawnTire {
  id: string;
  /** In full: "Drive left outer". */
  name: string;
  /** Cold gauge pressure, kPa; undefined while not read. */
  pressureKpa?: number;
  targetKpa: number;
  needsAir?: boolean;
  /** A short word below the figures: "not filled", "warm". */
  note?: ReactNode;
  /** Where a press on the tire leads. */
  href?: string;
  /** The tire that is asked for now. */
  current?: boolean;
}

export interface DrawnAxle {
  /** "Steer", "Drive", "Tag". */
  name: string;
  /** Left to right as seen from behind: two, or four with duals. */
  tires: readonly DrawnTire[];
}

export interface AxleDrawingProps {
  /** Front first. */
  axles: readonly DrawnAxle[];
  unit: PressureUnit;
}

/** A coach as its axles: one named beam a row, a vessel for each tire in its place. */
export function AxleDrawing({ axles, unit }: AxleDrawingProps) {
  return (
    <figure className="axles">
      {axles.map((axle) => (
        <section className="axle" key={axle.name} aria-label={`${axle.name} axle`}>
          <ul className="axle-tires" data-count={axle.tires.length}>
            {axle.tires.map((tire) => (
              <AxleTire key={tire.id} tire={tire} unit={unit} />
            ))}
          </ul>
          <span className="axle-name" aria-hidden="true">
            {axle.name}
          </span>
        </section>
      ))}
      <figcaption className="axle-scale">{scaleWords(unit)}</figcaption>
    </figure>
  );
}

function AxleTire({ tire, unit }: { tire: DrawnTire; unit: PressureUnit }) {
  const body = (
    <>
      <span className="only-heard">{tire.name}: </span>
      <TireVessel
        pressureKpa={tire.pressureKpa}
        targetKpa={tire.targetKpa}
        unit={unit}
        needsAir={tire.needsAir}
      />
      <b>{shown(tire.pressureKpa, unit)}</b>
      <span className="axle-of">of {shown(tire.targetKpa, unit, true)}</span>
      {tire.note && <span className="axle-note">{tire.note}</span>}
    </>
  );
  return (
    <li className="axle-tire" data-current={tire.current || undefined}>
      {tire.href ? (
        <Link to={tire.href} title={tire.name} aria-current={tire.current ? 'step' : undefined}>
          {body}
        </Link>
      ) : (
        <div title={tire.name}>{body}</div>
      )}
    </li>
  );
}

function shown(kpa: number | undefined, unit: PressureUnit, trim = false): string {
  if (kpa === undefined) return '–';
  return formatPressure(gaugeKpa(kpa), unit, { withUnit: false, trim });
}
