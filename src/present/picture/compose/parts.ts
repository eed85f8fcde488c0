import type { Answer } from '../../../answers/answer.ts';
import { counted } from '../../../wording/words.ts';
import type { Sheet } from '../sheet.ts';

/** The corners and the name of the file, the same for every answer. */
export const identified = (answer: Pick<Answer, 'asOf' | 'id' | 'verb' | 'subject'>) => ({
  corners: [`Data to ${answer.asOf}`, answer.id] as const,
  fileName: `${[answer.verb, ...answer.subject, answer.id].join('-').replace(/[^\w.-]+/g, '_')}.png`,
});

/** `60 returns to 2026-11-27`. */
export const basisInWords = ({ returnCount, asOf }: Pick<Answer, 'returnCount' | 'asOf'>): string =>
  `${counted(returnCount, 'return')} to ${asOf}`;

/** Alt text is one paragraph: what kind of picture, what it shows, what it rests on. */
export const altText = (parts: readonly string[]): string => parts.filter((part) => part !== '').join(' ');

export type Drawn = Omit<Sheet, 'corners' | 'fileName'>;
