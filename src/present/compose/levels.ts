import type { Answer } from '../../answers/answer.ts';
import { levelInWords } from '../../wording/percent.ts';
import type { Button } from '../reply.ts';

/** Levels that the trade asks for; the ones next to the level that was shown are offered. */
const rungs = { interval: [0.9, 0.95, 0.99, 0.999], tail: [0.95, 0.975, 0.99] } as const;

type Shown = {
  readonly level: number;
  readonly rungs: readonly number[];
  /** The word with which the language asks for it. */
  readonly word: 'at' | 'confidence';
};

/** Which level of an answer another one can take the place of; null where it has none. */
const shownLevel = (answer: Answer): Shown | null => {
  switch (answer.kind) {
    case 'tail':
    case 'backtest':
      return { level: answer.figures.tailLevel, rungs: rungs.tail, word: 'at' };
    case 'tail beyond':
    case 'shape':
      return { level: answer.figures.confidenceLevel, rungs: rungs.interval, word: 'confidence' };
    default:
      return { level: answer.figures.confidenceLevel, rungs: rungs.interval, word: 'at' };
  }
};

/** Buttons that ask the same at the next level up and the next level down: `At 99%`, `At 90%`. */
export const levelButtons = (answer: Answer): readonly Button[] => {
  const shown = shownLevel(answer);
  if (shown === null) return [];
  const up = shown.rungs.find((rung) => rung > shown.level);
  const down = shown.rungs.findLast((rung) => rung < shown.level);
  return [up, down].flatMap((rung) => {
    if (rung === undefined) return [];
    const level = levelInWords(rung);
    const label = shown.word === 'at' ? `At ${level}` : `Confidence ${level}`;
    const added = `${shown.word} ${level}`;
    return [{ action: 'level', label, answerId: answer.id, question: answer.question, added } as const];
  });
};
