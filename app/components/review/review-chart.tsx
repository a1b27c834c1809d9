import { useId } from 'react';
import {
  Area,
  CartesianGrid,
  ComposedChart,
  Line,
  ReferenceArea,
  ReferenceLine,
  XAxis,
  YAxis,
  ZIndexLayer,
} from 'recharts';
import { formatPressure, gaugeKpa, type PressureUnit } from '~/units';
import { drawnRange, pressureTicks, timeTicks } from './axis-ticks';
import { ChartCalls } from './chart-calls';
import { belowPlot, frameFor } from './chart-frame';
import { ChartHolds, ChartNames, ChartReadings } from './chart-marks';
import { sinceStart } from './review-time';
import type { ChartView } from './review-view';

export interface ReviewChartProps {
  view: ChartView;
  unit: PressureUnit;
  /** Of the room that is reserved for it, px. */
  width: number;
  height: number;
}

/** Above readings and curves of the library's own layers. */
const onTop = 1000;

/**
 * The recorded trace. This module alone brings the chart library; only `review-figure.tsx` loads
 * it, after the page has come.
 */
export function ReviewChart({ view, unit, width, height }: ReviewChartProps) {
  const hatch = useId();
  const frame = frameFor(width);
  const ticks = pressureTicks(...drawnRange(view), unit);
  return (
    <ComposedChart
      accessibilityLayer={false}
      className="review-chart"
      width={width}
      height={height}
      data={view.points}
      margin={{ top: frame.top, right: frame.right, bottom: belowPlot(frame), left: 0 }}
    >
      <defs>
        <pattern id={hatch} width={9} height={9} patternUnits="userSpaceOnUse">
          <path className="review-hatch" d="M-2 11L11-2M-2 2L2-2M7 11L11 7" />
        </pattern>
      </defs>
      <CartesianGrid vertical={false} />
      {view.onSpans.map(({ from, to }) => (
        <ReferenceArea key={from} x1={from} x2={to} className="review-on" />
      ))}
      <Area dataKey="band" className="review-band" stroke="none" {...still} />
      <Area
        dataKey="lack"
        className="review-lack"
        stroke="none"
        {...still}
        fill={`url(#${hatch})`}
      />
      <ReferenceLine y={view.targetKpa} className="review-target" />
      <Line dataKey="supply" className="review-supply" {...still} />
      <Line dataKey="tire" className="review-tire-edge" {...still} />
      <Line dataKey="tire" className="review-tire" {...still} />
      <XAxis
        dataKey="at"
        type="number"
        domain={[0, view.until]}
        ticks={timeTicks(view.until, frame.mostTimes)}
        tickFormatter={sinceStart}
        tickMargin={frame.holds + 2}
        tickLine={false}
        height={1}
        interval={0}
        tick={inInk}
        fontSize={frame.letters}
      />
      <YAxis
        type="number"
        domain={[ticks[0]!, ticks.at(-1)!]}
        allowDataOverflow
        ticks={ticks}
        tickFormatter={(kpa: number) => axisFigure(kpa, unit)}
        width={frame.left}
        tickLine={false}
        axisLine={false}
        interval={0}
        tick={inInk}
        fontSize={frame.letters}
      />
      <text className="review-unit" x={0} y={14} fontSize={frame.letters}>
        {unit}
      </text>
      <ZIndexLayer zIndex={onTop}>
        <ChartHolds spans={view.onSpans} frame={frame} />
        <ChartNames view={view} frame={frame} />
        <ChartReadings view={view} frame={frame} />
        <ChartCalls calls={view.calls} frame={frame} />
      </ZIndexLayer>
    </ComposedChart>
  );
}

/** The library's own grey is too weak in both themes. */
const inInk = { fill: 'var(--ink)' };

const still = {
  type: 'linear',
  dot: false,
  activeDot: false,
  isAnimationActive: false,
  tooltipType: 'none',
} as const;

const axisFigure = (kpa: number, unit: PressureUnit) =>
  formatPressure(gaugeKpa(kpa), unit, {
    digits: unit === 'bar' ? 1 : 0,
    withUnit: false,
  });
