import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import type { TextFormat } from '../../terms/tableFormat.ts';
import { readSmallTable } from '../internal/read/smallTable.ts';

/** A holding in shares or contracts; negative is short. */
export type Position = { readonly ticker: string; readonly quantity: number };

export type PositionSettings = {
  readonly path: string;
  readonly columns: { readonly ticker: string; readonly quantity: string };
  readonly format: TextFormat;
};

/** The desk's positions in the order of the file. A ticker that stands there twice is refused, never added up. */
export const readPositions = async ({
  path,
  columns,
  format,
}: PositionSettings): Promise<Result<readonly Position[]>> => {
  const wanted = [
    { name: columns.ticker, kind: 'text', expected: 'the name of a ticker' },
    {
      name: columns.quantity,
      kind: 'number',
      expected: `a number of shares with a decimal ${format.decimalMark}`,
    },
  ] as const;
  const rows = await readSmallTable(path, format, wanted, 'the columns of the positions');
  if (!rows.ok) return rows;
  const positions = rows.value.map(([ticker, quantity]) => ({
    ticker: String(ticker),
    quantity: Number(quantity),
  }));
  const tickers = positions.map(({ ticker }) => ticker);
  const twice = tickers.find((ticker, at) => tickers.indexOf(ticker) !== at);
  if (twice === undefined) return succeed(positions);
  return refuse(
    problem(
      'valueUnreadable',
      `${path} has ${twice} twice. Write one row per ticker, with its whole quantity.`,
    ),
  );
};
