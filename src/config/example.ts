import { stringify } from 'yaml';
import { anyTicker, type SettingHelp, settingsHelp } from './help.ts';

/** What the example says beside the defaults, so that a fresh copy answers questions about the demonstration prices. */
const forDemonstration: Readonly<Record<string, unknown>> = {
  'feed.path': 'demo-prices.csv',
  'feed.prices.priceAdjustment': 'splits+dividends',
  'feed.prices.currency': 'USD',
  'feed.prices.closingTime': '16:30 Europe/London',
  'feed.prices.calendar': 'coast',
  'feed.tickers': { WRACK: { currency: 'GBP', quoteUnit: 'pence' } },
};

const head = [
  '# Settings of Leadsman. Every key is shown with its default unless it is needed for the demonstration prices;',
  '# leave out what you do not change. Tokens never stand here: they come from the environment',
  '# (SLACK_BOT_TOKEN, SLACK_APP_TOKEN for a socket connection, SLACK_SIGNING_SECRET for http, SLACK_API_URL).',
];

const valueText = (setting: SettingHelp): string => {
  const own = forDemonstration[setting.path];
  const value: unknown = own ?? (setting.fallback === null ? null : JSON.parse(setting.fallback));
  return stringify(value).trimEnd();
};

const keyAndValue = (key: string, value: string, indent: string): string =>
  value.includes('\n')
    ? `${indent}${key}:\n${value.replace(/^/gm, `${indent}  `)}`
    : `${indent}${key}: ${value}`;

const widestLine = 110;

const commentLines = (comment: string, indent: string): readonly string[] => {
  const lines: string[] = [];
  let line = `${indent}#`;
  for (const word of comment.split(' ')) {
    if (line.length + 1 + word.length > widestLine) {
      lines.push(line);
      line = `${indent}#`;
    }
    line += ` ${word}`;
  }
  return [...lines, line];
};

/** The example settings file, printed from the schema. */
export const exampleSettings = (): string => {
  const lines = [...head];
  const said = new Set<string>();
  let open: readonly string[] = [];
  for (const setting of settingsHelp()) {
    if (setting.path.includes(anyTicker)) continue;
    const keys = setting.path.split('.');
    const shared = keys.findIndex((key, depth) => key !== open[depth]);
    for (let depth = shared; depth < keys.length - 1; depth += 1) {
      if (depth === 0) lines.push('');
      lines.push(`${'  '.repeat(depth)}${keys[depth]}:`);
    }
    if (keys.length === 1) lines.push('');
    const indent = '  '.repeat(keys.length - 1);
    const comment = `${setting.says} (${setting.expects})`;
    // what was said of a setting is not said again of its namesakes
    if (!said.has(comment)) lines.push(...commentLines(comment, indent));
    said.add(comment);
    lines.push(keyAndValue(keys.at(-1) ?? '', valueText(setting), indent));
    open = keys.slice(0, -1);
  }
  return `${lines.join('\n')}\n`;
};
