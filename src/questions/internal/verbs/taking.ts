import type { Level } from '../../../terms/level.ts';
import { levelText } from '../../../terms/level.ts';
import { type Window, windowText } from '../../../terms/window.ts';
import type { Sample } from '../../question.ts';
import { firstOf, has, type Placed } from '../pieces/piece.ts';

/** Takes what was asked, else the default, and keeps in words which defaults were taken. */
export type Taking = {
  readonly assumed: readonly string[];
  readonly orDefault: <Value>(asked: Value | null, fallback: Value, inWords: string) => Value;
};

export const createTaking = (): Taking => {
  const assumed: string[] = [];
  return {
    assumed,
    orDefault: (asked, fallback, inWords) => {
      if (asked !== null) return asked;
      assumed.push(`${inWords} (default)`);
      return fallback;
    },
  };
};

/** The window and the kind of return that every statistical question has. */
export const takeSample = (taking: Taking, pieces: readonly Placed[], fallback: Window): Sample => {
  const asked = firstOf(pieces, 'window')?.window ?? null;
  return {
    window: taking.orDefault(asked, fallback, windowText(fallback)),
    windowAsked: asked !== null,
    returnType: has(pieces, 'log') ? 'log' : 'simple',
  };
};

export const takeLevel = (taking: Taking, pieces: readonly Placed[], fallback: Level): Level =>
  taking.orDefault(firstOf(pieces, 'level')?.level ?? null, fallback, levelText(fallback));
