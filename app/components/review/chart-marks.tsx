import type { TimeSpan } from '~/fill/chuck-spans';
import { formatDuration, seconds } from '~/units';
import type { ChartFrame } from './chart-frame';
import { textWidth, useChartScales } from './chart-scales';
import { spreadHeights } from './end-labels';
import { placeKindLabels } from './reading-labels';
import type { ChartView, ReadingKind } from './review-view';

const kindNames: Record<ReadingKind, string> = {
  'wheel-gauge': 'wheel gauge',
  'dash-gauge': 'dash gauge',
  sensor: 'sensor',
  tire: 'tire gauge',
};

/** A shape for each gauge: disc, square, diamond; a triangle for the tire. */
const shapes: Record<ReadingKind, string> = {
  'wheel-gauge': 'M-6 0a6 6 0 1 0 12 0a6 6 0 1 0-12 0z',
  'dash-gauge': 'M-5.5-5.5h11v11h-11z',
  sensor: 'M0-7.5L7.5 0L0 7.5L-7.5 0z',
  tire: 'M0-7.5L7.5 6h-15z',
};

/** The readings as dots, each kind named once. */
export function ChartReadings({ view, frame }: { view: ChartView; frame: ChartFrame }) {
  const scales = useChartScales();
  if (!scales) return null;
  const { plot, x, y } = scales;
  const dots = view.readings.map(({ at, kpa, kind }) => ({ x: x(at), y: y(kpa), kind }));
  const curves = view.points.flatMap(({ at, supply, tire }) => [
    { x: x(at), y: y(supply) },
    { x: x(at), y: y(tire) },
  ]);
  const names = placeKindLabels(dots, curves, {
    left: plot.x,
    right: plot.x + plot.width,
    top: plot.y,
    bottom: plot.y + plot.height,
    height: frame.letters + 4,
    widthOf: (kind) => textWidth(kindNames[kind], frame.letters),
  });
  return (
    <g className="review-readings" fontSize={frame.letters}>
      {dots.map((dot) => (
        <path
          key={`${dot.kind} ${dot.x} ${dot.y}`}
          data-kind={dot.kind}
          d={shapes[dot.kind]}
          transform={`translate(${dot.x} ${dot.y})`}
        />
      ))}
      {names.map(({ kind, left, middle }) => (
        <text key={kind} x={left} y={middle} dominantBaseline="central">
          {kindNames[kind]}
        </text>
      ))}
    </g>
  );
}

/** Below the plot: when the chuck was on, and for how long. */
export function ChartHolds({ spans, frame }: { spans: readonly TimeSpan[]; frame: ChartFrame }) {
  const scales = useChartScales();
  if (!scales) return null;
  const { plot, x } = scales;
  const top = plot.y + plot.height;
  return (
    <g className="review-holds" fontSize={frame.letters}>
      {spans.map(({ from, to }) => {
        const width = Math.max(2, x(to) - x(from));
        const words = holdWords(to - from, width, frame.letters);
        return (
          <g key={from}>
            <rect x={x(from)} y={top} width={width} height={frame.holds - 2} />
            <text
              x={x(from) + width / 2}
              y={top + frame.holds / 2 - 1}
              textAnchor="middle"
              dominantBaseline="central"
            >
              {words}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** The longest words that fit: "On 0:52", "0:52", "On" or none. */
function holdWords(length: number, width: number, letters: number): string {
  const time = formatDuration(seconds(length));
  const fits = [`On ${time}`, time, 'On'].find((text) => textWidth(text, letters) + 6 <= width);
  return fits ?? '';
}

/** The names of the curves at their right ends, moved apart where they would meet. */
export function ChartNames({ view, frame }: { view: ChartView; frame: ChartFrame }) {
  const scales = useChartScales();
  const last = view.points.at(-1);
  if (!scales || !last) return null;
  const { plot, y } = scales;
  const names = [
    { name: 'Supply', kind: 'supply', at: y(last.supply) },
    { name: 'Tire', kind: 'tire', at: y(last.tire) },
    { name: 'Target', kind: 'target', at: y(view.targetKpa) },
  ];
  const heights = spreadHeights(
    names.map(({ at }) => at),
    { step: frame.letters + 4, top: plot.y + 6, bottom: plot.y + plot.height - 8 },
  );
  const edge = plot.x + plot.width;
  return (
    <g className="review-names" fontSize={frame.letters}>
      {names.map(({ name, kind, at }, index) => (
        <g key={kind}>
          <path className="review-leader" d={`M${edge + 2} ${at}L${edge + 11} ${heights[index]}`} />
          <text
            className={`review-name-${kind}`}
            x={edge + 14}
            y={heights[index]}
            dominantBaseline="central"
          >
            {name}
          </text>
        </g>
      ))}
    </g>
  );
}
