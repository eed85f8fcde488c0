import { z } from 'zod';
import { dateFormats, decimalMarks, delimiters } from '../terms/tableFormat.ts';
import { described } from './internal/described.ts';
import { currencyCode, localTimeAndZone } from './kinds.ts';

const priceAdjustments = ['none', 'splits', 'splits+dividends', 'unknown'] as const;

const meaning = {
  priceAdjustment: {
    kind: z.enum(priceAdjustments),
    says: 'how closes were adjusted for what happened to the share; unknown warns in every tail answer',
    expects: 'none, splits, splits+dividends or unknown',
  },
  currency: {
    kind: currencyCode.nullable(),
    says: 'currency of the closes',
    expects: 'an ISO 4217 code such as USD, or null where it is not known',
  },
  quoteUnit: {
    kind: z.enum(['pence', 'cents']).nullable(),
    says: 'unit of the closes where it is a hundredth of the currency',
    expects: 'pence or cents, or null where closes are in the currency itself',
  },
  closingTime: {
    kind: localTimeAndZone.nullable(),
    says: 'local time and zone of the close; comparing tickers that close at different times warns',
    expects: 'a time and an IANA zone such as 17:30 Europe/London, or null where it is not known',
  },
  calendar: {
    kind: z.string().trim().min(1).nullable(),
    says: 'name of the group of tickers that share holidays',
    expects: 'a name of your choice, or null where it is not known',
  },
} as const;

const meaningForAll = z.strictObject({
  priceAdjustment: described(meaning.priceAdjustment).default('unknown'),
  currency: described(meaning.currency).default(null),
  quoteUnit: described(meaning.quoteUnit).default(null),
  closingTime: described(meaning.closingTime).default(null),
  calendar: described(meaning.calendar).default(null),
});

const meaningOfOne = z.strictObject({
  priceAdjustment: described(meaning.priceAdjustment).optional(),
  currency: described(meaning.currency).optional(),
  quoteUnit: described(meaning.quoteUnit).optional(),
  closingTime: described(meaning.closingTime).optional(),
  calendar: described(meaning.calendar).optional(),
});

const columnName = (column: string) =>
  described({
    kind: z.string().min(1),
    says: `name of the ${column} column`,
    expects: 'the column’s name as it stands in the first row of the file',
  }).default(column);

const optionalColumn = (says: string) =>
  described({
    kind: z.string().min(1).nullable(),
    says,
    expects: 'the column’s name as it stands in the first row of the file, or null where there is none',
  }).default(null);

const columns = z
  .strictObject({
    date: columnName('date'),
    ticker: columnName('ticker'),
    close: columnName('close'),
    adjustedClose: optionalColumn(
      'name of the column of adjusted closes; where it is named, these are the prices used',
    ),
    volume: optionalColumn('name of the volume column, which is only checked'),
    currency: optionalColumn('name of the currency column'),
  })
  .prefault({});

const format = z
  .strictObject({
    delimiter: described({
      kind: z.enum(delimiters),
      says: 'what stands between the cells of a CSV file',
      expects: 'comma, semicolon or tab',
    }).default('comma'),
    decimalMark: described({
      kind: z.enum(decimalMarks),
      says: 'what stands before the decimals of a number in a CSV file; digits are never grouped',
      expects: 'point or comma',
    }).default('point'),
    dateFormat: described({
      kind: z.enum(dateFormats),
      says: 'how dates are written in a CSV file; another form is never tried',
      expects: `one of ${dateFormats.join(', ')}`,
    }).default('YYYY-MM-DD'),
  })
  .prefault({});

const holidays = z
  .strictObject({
    path: described({
      kind: z.string().trim().min(1).nullable(),
      says: 'file of days without trading, written in the same format as the prices',
      expects: 'the path of a CSV or Parquet file, or null where there is none',
    }).default(null),
    columns: z
      .strictObject({
        date: columnName('date'),
        calendar: optionalColumn('name of the column that names the calendar'),
      })
      .prefault({}),
  })
  .prefault({});

/** What the desk says of its price files. */
export const feed = z.strictObject({
  path: described({
    kind: z.string().trim().min(1),
    says: 'the price files; a relative path starts at the folder of the settings file',
    expects:
      'the path of a file ending in .csv, .csv.gz, .csv.zst or .parquet, of a folder of them, or a pattern with *',
  }),
  shape: described({
    kind: z.enum(['long', 'wide']),
    says: 'long has one row per date and ticker, wide one row per date and one column per ticker',
    expects: 'long or wide',
  }).default('long'),
  columns,
  format,
  holidays,
  checkEverySeconds: described({
    kind: z.int().min(1).max(3600),
    says: 'how often the price files are looked at, beside the notices of the file system, which network drives lack',
    expects: 'a whole number of seconds from 1 to 3600',
  }).default(5),
  prices: meaningForAll
    .prefault({})
    .meta({ description: 'what the closes of every ticker are, unless feed.tickers says otherwise' }),
  tickers: z.record(z.string(), meaningOfOne).default({}).meta({
    description: 'what the closes of single tickers are',
    expects: 'tickers, each with any of the settings under feed.prices',
  }),
});
