/** Where data lie in a picture. */
export interface PlotFrame {
  width: number;
  height: number;
  /** Edges of the data, px. */
  left: number;
  right: number;
  top: number;
  bottom: number;
  xRange: [number, number];
  yRange: [number, number];
  x: (value: number) => number;
  y: (value: number) => number;
  /** How much further out the axes stand, px: where something is drawn around the data. */
  axisShift?: { x: number; y: number };
}

export interface PlotFrameOptions {
  width: number;
  height: number;
  xRange: [number, number];
  yRange: [number, number];
  /** The same scale on both axes: coordinates of phase space. */
  equal?: boolean;
  margin?: { left: number; right: number; top: number; bottom: number };
}

const MARGIN = { left: 68, right: 28, top: 26, bottom: 44 };
/** Extents that differ by more than this would make an equal picture a line. */
const MOST_UNEQUAL = 20;

/** Scales that put the data's ranges into a picture. */
export function plotFrame(options: PlotFrameOptions): PlotFrame {
  const { width, height, xRange, yRange, equal = false, margin = MARGIN } = options;
  const room = {
    x: Math.max(10, width - margin.left - margin.right),
    y: Math.max(10, height - margin.top - margin.bottom),
  };
  const span = { x: xRange[1] - xRange[0], y: yRange[1] - yRange[0] };
  const ratio = span.x / span.y;
  let scale = { x: room.x / span.x, y: room.y / span.y };
  if (equal && ratio < MOST_UNEQUAL && ratio > 1 / MOST_UNEQUAL) {
    const both = Math.min(scale.x, scale.y);
    scale = { x: both, y: both };
  }
  const left = margin.left + (room.x - span.x * scale.x) / 2;
  const top = margin.top + (room.y - span.y * scale.y) / 2;
  return {
    width,
    height,
    left,
    right: left + span.x * scale.x,
    top,
    bottom: top + span.y * scale.y,
    xRange,
    yRange,
    x: (value) => left + (value - xRange[0]) * scale.x,
    y: (value) => top + (yRange[1] - value) * scale.y,
  };
}
