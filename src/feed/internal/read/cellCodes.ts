import type { TextFormat } from '../../../terms/tableFormat.ts';
import { daySql, numberSql, type SourceColumn, textSql } from './cellSql.ts';

/**
 * Cells without a value are told by numbers that no cell can have, so that a column needs no second look for nulls.
 * A day number is far inside these ends; a price of the blank's size would be below zero and never be served.
 */
export const unreadDay = -2_147_483_648;
export const blankDay = -2_147_483_647;
export const blankPrice = -Number.MAX_VALUE;

const isBlank = (column: SourceColumn): string => `${textSql(column)} IS NULL`;

/** The day number of a cell, or the code for none. */
export const codedDaySql = (column: SourceColumn, format: TextFormat): string =>
  `coalesce(${daySql(column, format)}, CAST(CASE WHEN ${isBlank(column)} THEN ${blankDay} ELSE ${unreadDay} END AS INTEGER))`;

/** The number of a cell; the code for a blank one, not-a-number for one that cannot be read. */
export const codedPriceSql = (column: SourceColumn, format: TextFormat): string => {
  const blank = `CASE WHEN ${isBlank(column)} THEN CAST('${blankPrice}' AS DOUBLE) ELSE CAST('nan' AS DOUBLE) END`;
  return `coalesce(${numberSql(column, format.decimalMark)}, ${blank})`;
};

/** Whether a number can be a price at all. */
export const isPrice = (price: number): boolean => price > 0 && price < Number.POSITIVE_INFINITY;

export type PriceCode = 'blankPrice' | 'unreadablePrice' | 'priceNotFinite' | 'priceNotPositive';

/** Why a number is no price. */
export const codeOfNoPrice = (price: number): PriceCode => {
  if (price === blankPrice) return 'blankPrice';
  if (Number.isNaN(price)) return 'unreadablePrice';
  return Number.isFinite(price) ? 'priceNotPositive' : 'priceNotFinite';
};
