import { type CSSProperties, useLayoutEffect, useRef, useState } from 'react';
import type { VesselState } from '~/fill/vessel-state';
import { placeMarks, vesselSize } from './vessel-places';

/** The level and the line: supply, tire, target, cut-in and cut-out, readable without a number. */
export function LiveVessel({ vessel, bare = false }: { vessel: VesselState; bare?: boolean }) {
  const [box, heightPx] = useHeight();
  const { supply, tire, above } = vessel;
  const places = {
    '--low': `${supply.low}%`,
    '--high': `${Math.max(supply.high, supply.low + 0.5)}%`,
    '--middle': `${supply.middle}%`,
    '--tire': `${tire.height}%`,
  } as CSSProperties;
  const size = bare ? 'bare' : vesselSize(heightPx);
  return (
    <div
      className="vessel"
      data-size={size}
      data-above={above || undefined}
      style={places}
      ref={box}
      aria-hidden="true"
    >
      <div className="vessel-level" />
      {vessel.known && <div className={above ? 'vessel-head' : 'vessel-lack'} />}
      {vessel.marks.map((mark) => (
        <div
          key={mark.kind}
          className={`vessel-mark vessel-${mark.kind}`}
          style={{ bottom: `${mark.height}%` }}
        />
      ))}
      <div className="vessel-line" />
      {size !== 'bare' &&
        placeMarks(vessel.marks, heightPx).map((mark) => (
          <span key={mark.kind} className="vessel-mark-text" style={{ bottom: `${mark.height}%` }}>
            {mark.text}
          </span>
        ))}
      {size !== 'bare' && (
        <>
          <span className="vessel-tag vessel-tag-supply">
            <small>Supply</small>
            {supply.text}
          </span>
          <span className="vessel-tag vessel-tag-tire">
            <small>Tire</small>
            {tire.text}
          </span>
        </>
      )}
    </div>
  );
}

/** A height to draw with before the first measurement, px. */
const usualHeight = 150;

function useHeight() {
  const box = useRef<HTMLDivElement>(null);
  const [height, setHeight] = useState(usualHeight);
  useLayoutEffect(() => {
    const element = box.current;
    if (!element) return;
    const watch = new ResizeObserver(() => setHeight(element.clientHeight));
    watch.observe(element);
    return () => watch.disconnect();
  }, []);
  return [box, height] as const;
}
