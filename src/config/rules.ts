import { nearestWord } from '../terms/nearest.ts';
import { confinableVerbs, directMessages } from './permissionsSchema.ts';
import { defaultRecordsPath } from './recordsSchema.ts';
import type { Settings } from './schema.ts';

/** Something wrong between settings that are each right alone. */
export type RuleBreach = { readonly path: string; readonly value: string; readonly message: string };

export type Rule = (settings: Settings) => readonly RuleBreach[];

/** In a wide file the date is the only column with a name of its own; the others are tickers. */
const columnNamesDiffer: Rule = ({ feed }) => {
  if (feed.shape === 'wide') return [];
  const seen = new Map<string, string>();
  const breaches: RuleBreach[] = [];
  for (const [column, name] of Object.entries(feed.columns)) {
    if (name === null) continue;
    const other = seen.get(name);
    if (other === undefined) seen.set(name, column);
    else {
      const message = `it is also feed.columns.${other}; every column has a name of its own`;
      breaches.push({ path: `feed.columns.${column}`, value: name, message });
    }
  }
  return breaches;
};

const message = 'a quote unit is a hundredth of a currency, so the currency must be given too';

const quoteUnitNeedsCurrency: Rule = ({ feed }) => {
  const { currency, quoteUnit } = feed.prices;
  const forAll =
    quoteUnit !== null && currency === null
      ? [{ path: 'feed.prices.quoteUnit', value: quoteUnit, message }]
      : [];
  const forOne = Object.entries(feed.tickers).flatMap(([ticker, meaning]) => {
    const unit = meaning.quoteUnit;
    const known = meaning.currency === undefined ? currency : meaning.currency;
    return typeof unit === 'string' && known === null
      ? [{ path: `feed.tickers.${ticker}.quoteUnit`, value: unit, message }]
      : [];
  });
  return [...forAll, ...forOne];
};

const wideHasNoOtherColumns: Rule = ({ feed }) => {
  if (feed.shape !== 'wide') return [];
  return (['adjustedClose', 'volume', 'currency'] as const).flatMap((column) => {
    const name = feed.columns[column];
    if (name === null) return [];
    const advice = 'in the wide shape every column beside the date is a ticker; use the long shape for it';
    return [{ path: `feed.columns.${column}`, value: name, message: advice }];
  });
};

const decimalMarkIsNotDelimiter: Rule = ({ feed: { format } }) =>
  format.decimalMark === 'comma' && format.delimiter === 'comma'
    ? [
        {
          path: 'feed.format.decimalMark',
          value: format.decimalMark,
          message:
            'the cells are separated by a comma too; files with a decimal comma have another delimiter',
        },
      ]
    : [];

const confinedVerbsExist: Rule = ({ permissions }) =>
  Object.entries(permissions.verbs).flatMap(([verb, places]) => {
    if (confinableVerbs.some((known) => known === verb)) return [];
    const nearest = nearestWord(verb, confinableVerbs);
    const advice =
      nearest === null ? `the verbs are ${confinableVerbs.join(', ')}` : `${nearest} comes nearest`;
    return [
      {
        path: `permissions.verbs.${verb}`,
        value: places.join(', ') || 'empty',
        message: `it is no verb; ${advice}`,
      },
    ];
  });

/** A channel that is named further down but denied further up would look open and stay shut. */
const namedChannelsAreOpen: Rule = ({ permissions: { channels, sharedChannels, verbs } }) => {
  if (channels.length === 0) return [];
  const named = [
    ...sharedChannels.map((channel) => ({ path: 'permissions.sharedChannels', channel })),
    ...Object.entries(verbs).flatMap(([verb, places]) =>
      places.map((channel) => ({ path: `permissions.verbs.${verb}`, channel })),
    ),
  ];
  return named
    .filter(({ channel }) => !channels.includes(channel))
    .map(({ path, channel }) => {
      const what = channel === directMessages ? 'direct messages are' : 'that channel is';
      return {
        path,
        value: channel,
        message: `${what} not among permissions.channels, where it has to stand too`,
      };
    });
};

const oneStoreOfRecords: Rule = ({ records: { path, url } }) =>
  url !== null && path !== defaultRecordsPath
    ? [
        {
          path: 'records.path',
          value: path,
          message: 'records.url is set too, and the records are kept in one place; take one of them out',
        },
      ]
    : [];

export const rules: readonly Rule[] = [
  oneStoreOfRecords,
  columnNamesDiffer,
  quoteUnitNeedsCurrency,
  wideHasNoOtherColumns,
  decimalMarkIsNotDelimiter,
  confinedVerbsExist,
  namedChannelsAreOpen,
];
