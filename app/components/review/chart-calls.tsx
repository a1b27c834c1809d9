import type { Call } from '~/air';
import { placeLabels } from './call-lanes';
import type { ChartFrame } from './chart-frame';
import { textWidth, useChartScales } from './chart-scales';
import type { ShownCall } from './review-view';

/** Between a call's edge and its words, px. */
const inset = 5;

/** The calls below the time axis, each led up to its moment; words only where there is room. */
export function ChartCalls({ calls, frame }: { calls: readonly ShownCall[]; frame: ChartFrame }) {
  const scales = useChartScales();
  if (!scales) return null;
  const { plot, x } = scales;
  const top = plot.y + plot.height + frame.holds + frame.times;
  const wanted = calls.map(({ at, call, words }) => ({
    call,
    x: x(at),
    width: textWidth(words, frame.letters) + 2 * inset,
  }));
  const room = { count: frame.lanes, from: 0, to: plot.x + plot.width + frame.right };
  const placed = placeLabels(wanted, room);
  return (
    <g className="review-calls" fontSize={frame.letters}>
      {wanted.map((label, index) => (
        <path key={calls[index]?.at} className="review-leader" d={`M${label.x} ${top - 5}v5`} />
      ))}
      {placed.map(({ index, lane, left }) => {
        const { call, words } = calls[index]!;
        const y = top + lane * frame.laneHeight;
        const { x: at, width } = wanted[index]!;
        return (
          <g key={index}>
            <path className="review-leader" d={`M${at} ${top}V${y + frame.laneHeight - 2}`} />
            <rect
              className={lookOf(call)}
              x={left}
              y={y + 1}
              width={width}
              height={frame.laneHeight - 3}
            />
            <text x={left + inset} y={y + frame.laneHeight / 2} dominantBaseline="central">
              {words}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** Filled where the chuck belongs on, framed where it comes off; the rest is plain. */
function lookOf(call: Call): string {
  if (call === 'chuck-on' || call === 'keep-on') return 'review-call-on';
  return call === 'chuck-off' ? 'review-call-off' : 'review-call-plain';
}
