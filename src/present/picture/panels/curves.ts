import { colours } from '../look.ts';

/** The two fitted distributions, told apart by colour and by dashes alike. */
export const curveNames = { student: 'fitted t', normal: 'bell curve' } as const;

const names = [curveNames.student, curveNames.normal];

export const curveLegend = (legend: object | null) => ({
  color: {
    field: 'curve',
    type: 'nominal' as const,
    scale: { domain: names, range: [colours.blue, colours.vermillion] },
    legend,
  },
  strokeDash: {
    field: 'curve',
    type: 'nominal' as const,
    scale: {
      domain: names,
      range: [
        [1, 0],
        [6, 3],
      ],
    },
    legend,
  },
});

type BothCurves = { readonly normal: number; readonly student: number | null };

/** One row for each curve that there is. */
export const curveRows = <Place>(
  places: readonly Place[],
  at: (place: Place) => number,
  heights: (place: Place) => BothCurves,
) =>
  places.flatMap((place) => {
    const { normal, student } = heights(place);
    const x = at(place);
    return [
      ...(student === null ? [] : [{ curve: curveNames.student, x, y: student }]),
      { curve: curveNames.normal, x, y: normal },
    ];
  });

type CurvePoint = { readonly curve: string; readonly x: number; readonly y: number };

/** Tails of a distribution can be smaller than any number; their logarithm is still needed. */
const leastShare = 1e-300;

/** The place between two points at which the curve leaves the plot, on a vertical scale of powers. */
const leaving = (from: CurvePoint, to: CurvePoint, high: number, low: number): CurvePoint => {
  const [fromLog, toLog] = [Math.log(from.y), Math.log(Math.max(leastShare, to.y))];
  const share = Math.min(
    to.x > high ? (high - from.x) / (to.x - from.x) : 1,
    to.y < low ? (fromLog - Math.log(low)) / (fromLog - toLog) : 1,
  );
  return {
    curve: from.curve,
    x: from.x + share * (to.x - from.x),
    y: Math.exp(fromLog + share * (toLog - fromLog)),
  };
};

/**
 * Falling curves up to where they leave the plot on the right or below. The rasteriser draws whatever is clipped on a
 * layer of its own, which costs as much as the picture.
 */
export const untilTheyLeave = (
  points: readonly CurvePoint[],
  high: number,
  low: number,
): readonly CurvePoint[] =>
  [...new Set(points.map(({ curve }) => curve))].flatMap((curve) => {
    const own = points.filter((point) => point.curve === curve);
    const out = own.findIndex(({ x, y }) => x > high || y < low);
    const [last, next] = [own[out - 1], own[out]];
    if (last === undefined || next === undefined) return out === 0 ? [] : own;
    return [...own.slice(0, out), leaving(last, next, high, low)];
  });
