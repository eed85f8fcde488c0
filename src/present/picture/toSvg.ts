import { parse, textMetrics, View } from 'vega';
import { compile } from 'vega-lite';
import { framed } from './frame.ts';
import { chartLook } from './look.ts';
import { textWidth } from './metrics.ts';
import type { ChartSpec, Sheet } from './sheet.ts';

type Lettered = {
  readonly fontSize?: number;
  readonly fontWeight?: string | number;
  readonly text?: unknown;
};

/** The library measures on a canvas or guesses; neither gives the same layout on every machine. */
const measureByTable = (): void => {
  textMetrics.width = ({ fontSize = 11, fontWeight, text }: Lettered, given?: unknown) =>
    textWidth(String(given ?? text ?? ''), { fontSize, bold: fontWeight === 'bold' || fontWeight === 700 });
};

const gapBetweenPanels = 18;

/** The chart of a sheet as one specification in the grammar. */
export const chartOf = ({
  panels,
  panelGap = gapBetweenPanels,
}: Pick<Sheet, 'panels' | 'panelGap'>): ChartSpec => ({
  vconcat: [...panels],
  spacing: panelGap,
  autosize: { type: 'pad' },
  resolve: { scale: { x: 'independent', y: 'independent', color: 'independent', strokeDash: 'independent' } },
  config: chartLook,
});

/** Draws a sheet. The same sheet gives the same text, on every machine. */
export const toSvg = async (sheet: Sheet): Promise<string> => {
  measureByTable();
  const view = new View(parse(compile(chartOf(sheet)).spec), { renderer: 'none' });
  try {
    return framed(sheet, await view.toSVG());
  } finally {
    view.finalize();
  }
};
