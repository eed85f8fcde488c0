import { readRecordId, readSubscriptionId } from '../../ids.ts';
import { languageWords } from '../recognisers/table.ts';
import { verbOfWord } from '../verbs/verbWords.ts';

const plainTicker = /^[a-z](?:[a-z\d.^=/-]*[a-z\d])?$/i;

const needsBackTicks = (ticker: string): boolean => {
  const lower = ticker.toLowerCase();
  if (!plainTicker.test(ticker) || languageWords.has(lower) || verbOfWord(lower) !== null) return true;
  return readRecordId(ticker) !== null || readSubscriptionId(ticker) !== null;
};

/** The ticker as a question writes it: in back-ticks where it could be read as something else. */
export const writeTicker = (ticker: string): string => (needsBackTicks(ticker) ? `\`${ticker}\`` : ticker);
