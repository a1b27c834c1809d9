/** Measures of the chart, px, for a phone and for a desk. */
export interface ChartFrame {
  /** Room for the gradations of pressure, left of the plot. */
  left: number;
  /** Room for the names of the curves, right of the plot. */
  right: number;
  top: number;
  /** The strip below the plot in which the holds stand. */
  holds: number;
  /** The row of times below that. */
  times: number;
  lanes: number;
  laneHeight: number;
  /** The most times along the axis. */
  mostTimes: number;
  letters: number;
}

const phone: ChartFrame = {
  left: 38,
  right: 64,
  top: 30,
  holds: 22,
  times: 26,
  lanes: 5,
  laneHeight: 24,
  mostTimes: 5,
  letters: 15,
};

const desk: ChartFrame = { ...phone, left: 46, right: 84, lanes: 4, mostTimes: 11, letters: 16 };

/** From this width on the chart has the room of a desk, px. */
const deskWidth = 700;

export const frameFor = (width: number): ChartFrame => (width < deskWidth ? phone : desk);

/** Everything below the plot. */
export const belowPlot = ({ holds, times, lanes, laneHeight }: ChartFrame): number =>
  holds + times + lanes * laneHeight + 4;
