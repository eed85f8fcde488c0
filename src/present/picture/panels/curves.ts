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
