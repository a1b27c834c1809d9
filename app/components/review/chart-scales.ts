import { usePlotArea, useXAxisScale, useYAxisScale } from 'recharts';

export interface ChartScales {
  plot: { x: number; y: number; width: number; height: number };
  /** Seconds to px. */
  x: (at: number) => number;
  /** Gauge kPa to px. */
  y: (kpa: number) => number;
}

/** Where things stand in the chart; undefined until it has been measured. */
export function useChartScales(): ChartScales | undefined {
  const plot = usePlotArea();
  const x = useXAxisScale();
  const y = useYAxisScale();
  if (!plot || !x || !y || plot.width <= 0) return undefined;
  return { plot, x: (at) => x(at) ?? 0, y: (kpa) => y(kpa) ?? 0 };
}

let pen: CanvasRenderingContext2D | null | undefined;

/** Width of a text in the product's face, px. Estimated while the browser cannot measure. */
export function textWidth(text: string, letters: number): number {
  pen ??= document.createElement('canvas').getContext('2d');
  if (!pen) return text.length * letters * 0.56;
  pen.font = `${letters}px "Atkinson Hyperlegible", system-ui, sans-serif`;
  return Math.ceil(pen.measureText(text).width);
}
