import type { Answers } from '../../answers/answer.ts';
import type { AnswerInFigures, PictureData } from '../../answers/pictures/pictureData.ts';
import { backtestSheet } from './compose/backtest.ts';
import { beyondSheet } from './compose/beyond.ts';
import { digestSheet } from './compose/digest.ts';
import { feedSheet } from './compose/feed.ts';
import { ladderSheet } from './compose/ladder.ts';
import { needSheet } from './compose/need.ts';
import { shapeSheet } from './compose/shape.ts';
import { claimSheet, compareSheet, ratioSheet, volSheet } from './compose/single.ts';
import { tailSheet } from './compose/tail.ts';
import { tickerSheet } from './compose/ticker.ts';
import type { Sheet } from './sheet.ts';

const ofFigures = (answers: Answers, answer: AnswerInFigures): Sheet => {
  switch (answer.kind) {
    case 'interval mean':
      return ladderSheet(answer);
    case 'interval vol':
      return volSheet(answer);
    case 'interval ratio':
      return ratioSheet(answer);
    case 'claim':
      return claimSheet(answer);
    case 'compare':
      return compareSheet(answers, answer);
  }
};

/** What the picture shows and says. */
export const sheetOf = (data: PictureData): Sheet => {
  switch (data.kind) {
    case 'figures':
      return ofFigures(data.answers, data.answer);
    case 'tail':
      return tailSheet(data.answer, data.returns);
    case 'beyond':
      return beyondSheet(data.answer, data.returns);
    case 'shape':
      return shapeSheet(data.answer, data.points);
    case 'need':
      return needSheet(data.answer, data.widths);
    case 'backtest':
      return backtestSheet(data.answer, data.path);
    case 'feed':
      return feedSheet(data);
    case 'ticker':
      return tickerSheet(data);
    case 'digest':
      return digestSheet(data);
  }
};
