import type { BacktestAnswer } from '../../../answers/answer.ts';
import type { BacktestPath, CountStep } from '../../../answers/pictures/pictureData.ts';
import { isoFromDay } from '../../../terms/day.ts';
import { threeDigits } from '../../../wording/digits.ts';
import { levelInWords, percent } from '../../../wording/percent.ts';
import { counted, possessive } from '../../../wording/words.ts';
import { backtestReply } from '../../compose/backtest.ts';
import { windowInWords } from '../../compose/parts.ts';
import { percentLabel, plotFrame } from '../panels/axes.ts';
import { countPanel, pathPanel } from '../panels/backtest.ts';
import type { Sheet } from '../sheet.ts';
import { altText, identified } from './parts.ts';

const placeInBand = ({ count, lower, upper }: CountStep): string =>
  count > upper ? 'above the band' : count < lower ? 'below the band' : 'inside the band';

const countInWords = (last: CountStep, bandLevel: number): string =>
  `The count ends at ${last.count}, ${placeInBand(last)} of ${last.lower} to ${last.upper} that chance alone keeps to on ${levelInWords(bandLevel)} of occasions.`;

/** The worst of the marked days. */
const worstInWords = ({ exceedances }: BacktestPath): string => {
  const [first] = exceedances;
  if (first === undefined) return '';
  const worst = exceedances.reduce((one, other) => (other.value < one.value ? other : one), first);
  return `The largest marked loss is ${percent(0 - worst.value)} on ${isoFromDay(worst.day)}.`;
};

/** Returns against the moving figure of one model, its exceedances marked, and their running count against its band. */
export const backtestSheet = (answer: BacktestAnswer, path: BacktestPath): Sheet => {
  const { figures, subject } = answer;
  const level = levelInWords(figures.tailLevel);
  const reach = Math.max(
    ...path.steps.map(({ low, high, valueAtRisk }) => Math.max(-low, high, valueAtRisk ?? 0)),
  );
  const frame = plotFrame([percentLabel(reach), '1,000']);
  const last = path.counts.at(-1);
  const judged = figures.models.find((each) => each.ok && each.model === path.model);
  const tally =
    judged?.ok === true
      ? `${counted(judged.exceedances, 'exceedance')} of the ${path.model} figure in ${counted(judged.days, 'day')}; ${threeDigits(judged.expected)} expected.`
      : '';
  return {
    ...identified(answer),
    title: `${possessive(subject[0] ?? '')} VaR at ${level}, judged ${windowInWords(answer)}`,
    lines: [tally],
    panels: [
      pathPanel(path, `Returns, and the ${path.model} VaR of each day (▼ exceeded)`, frame),
      countPanel(path, `Exceedances so far; shaded: ${levelInWords(path.bandLevel)} band of chance`, frame),
    ],
    altText: altText([
      `Daily returns against the moving ${path.model} VaR, exceedances marked, and their running count against its band.`,
      tally,
      last === undefined ? '' : countInWords(last, path.bandLevel),
      worstInWords(path),
      backtestReply(answer).sentence,
    ]),
  };
};
