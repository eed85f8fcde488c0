import type { Config } from 'vega-lite';

/**
 * How pictures look. Light opaque ground with a border, so that they read the same on a light and on a dark page; sizes
 * chosen so that the smallest letters are 10 px high where the picture is shown 360 px wide.
 */
export const sheetWidth = 480;
export const sheetMargin = 14;
/** Pixels per unit of length: the picture is 720 pixels wide, two for each of a narrow telephone’s 360. */
export const pixelsPerUnit = 1.5;

export const fontFamily = 'DejaVu Sans';
export const sizes = { title: 17, line: 14, label: 13, head: 14, foot: 13 } as const;

/** Colours of Okabe & Ito (2008, Color Universal Design), which people of every colour vision tell apart, and greys. */
export const colours = {
  ground: '#ffffff',
  border: '#8a8a8a',
  ink: '#1a1a1a',
  quiet: '#595959',
  grid: '#e4e4e4',
  fill: '#c9c9c9',
  blue: '#0072b2',
  vermillion: '#d55e00',
  green: '#009e73',
  sky: '#56b4e9',
  orange: '#e69f00',
} as const;

export const chartLook: Config = {
  font: fontFamily,
  background: 'transparent',
  padding: 0,
  /** A PNG carries no roles; what is to be seen is said in the alt text. */
  aria: false,
  view: { stroke: null },
  axis: {
    labelFontSize: sizes.label,
    titleFontSize: sizes.label,
    titleFontWeight: 'normal',
    labelColor: colours.ink,
    titleColor: colours.quiet,
    gridColor: colours.grid,
    domainColor: colours.border,
    tickColor: colours.border,
    labelLimit: 0,
    titleLimit: 0,
    labelPadding: 4,
    titlePadding: 6,
  },
  title: {
    anchor: 'start',
    frame: 'bounds',
    fontSize: sizes.head,
    fontWeight: 'bold',
    color: colours.ink,
    offset: 8,
    limit: 0,
  },
  legend: {
    labelFontSize: sizes.label,
    labelColor: colours.ink,
    labelLimit: 0,
    symbolSize: 120,
    title: null,
    orient: 'top',
    direction: 'horizontal',
    columnPadding: 14,
    offset: 4,
  },
  text: { fontSize: sizes.label, color: colours.ink },
};
