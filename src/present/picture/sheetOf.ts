import type { PictureData } from '../../answers/pictures/pictureData.ts';
import { ladderSheet } from './compose/ladder.ts';
import type { Sheet } from './sheet.ts';

/** What the picture shows and says. */
export const sheetOf = ({ answers: [first] }: PictureData): Sheet => {
  if (first.kind !== 'interval mean') throw new Error(first.kind);
  return ladderSheet(first);
};
