import type { TopLevelSpec } from 'vega-lite';

/** A chart in the declarative grammar: panels one below the other. */
export type ChartSpec = Extract<TopLevelSpec, { readonly vconcat: unknown }>;
export type Panel = ChartSpec['vconcat'][number];

/** What a picture shows and says, before it is drawn. Plain data. */
export type Sheet = {
  readonly title: string;
  /** Sentences under the title. */
  readonly lines: readonly string[];
  readonly panels: readonly Panel[];
  /** Between the panels, where it is not the usual distance. */
  readonly panelGap?: number;
  /** In the corners at the foot: the day to which the data go, and the record. */
  readonly corners: readonly [string, string];
  /** What is to be seen, for who cannot see it. */
  readonly altText: string;
  readonly fileName: string;
};
