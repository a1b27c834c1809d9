import { type ComponentType, useEffect, useMemo, useRef, useState } from 'react';
import type { PressureUnit } from '~/units';
import type { ReviewChartProps } from './review-chart';
import type { ReviewTrace } from './review-model';
import { ReviewTable } from './review-table';
import { chartOf, linesOf } from './review-view';

export interface ReviewFigureProps {
  trace: ReviewTrace;
  unit: PressureUnit;
  /** The chart in one sentence, for those who don't see it. */
  summary: string;
}

/**
 * The recorded trace as a chart, and as a table one tap away. Until the chart's own script is there,
 * and where there is no script, the table stands in the chart's place.
 */
export function ReviewFigure({ trace, unit, summary }: ReviewFigureProps) {
  const lines = useMemo(() => linesOf(trace, unit), [trace, unit]);
  const { Chart, failed } = useChart();
  const table = <ReviewTable lines={lines} unit={unit} timeZone={trace.timeZone} />;
  return (
    <figure className="review-figure">
      <figcaption>
        <h2>The trace</h2>
        <p className="quiet">
          Supply and tire as estimated from what was tapped. The shaded edge holds four of five
          likely supplies. Hatched: the chuck was on with the supply below the tire.
        </p>
      </figcaption>
      {Chart ? (
        <MeasuredChart Chart={Chart} trace={trace} unit={unit} summary={summary} />
      ) : (
        <section className="review-space review-space-table" aria-label="The record">
          {failed && <p>The chart could not be loaded. Here is the table.</p>}
          {table}
        </section>
      )}
      {Chart && (
        <details className="review-details">
          <summary>The same as a table</summary>
          {table}
        </details>
      )}
    </figure>
  );
}

/** Loads the chart library once the page is there, so that no other page waits for it. */
function useChart() {
  const [Chart, setChart] = useState<ComponentType<ReviewChartProps>>();
  const [failed, setFailed] = useState(false);
  useEffect(() => {
    import('./review-chart').then(
      (module) => setChart(() => module.ReviewChart),
      () => setFailed(true),
    );
  }, []);
  return { Chart, failed };
}

interface MeasuredProps extends ReviewFigureProps {
  Chart: ComponentType<ReviewChartProps>;
}

function MeasuredChart({ Chart, trace, unit, summary }: MeasuredProps) {
  const view = useMemo(() => chartOf(trace), [trace]);
  const space = useRef<HTMLDivElement>(null);
  const size = useSize(space);
  return (
    <div className="review-space" ref={space} role="img" aria-label={`Chart. ${summary}`}>
      {size && <Chart view={view} unit={unit} {...size} />}
    </div>
  );
}

interface Size {
  width: number;
  height: number;
}

/** The room that an element has, now and after the window has changed. */
function useSize(of: React.RefObject<HTMLElement | null>): Size | undefined {
  const [size, setSize] = useState<Size>();
  useEffect(() => {
    const element = of.current;
    if (!element) return;
    const watch = new ResizeObserver(() =>
      setSize({ width: element.clientWidth, height: element.clientHeight }),
    );
    watch.observe(element);
    return () => watch.disconnect();
  }, [of]);
  return size;
}
