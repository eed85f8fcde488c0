import type { Line } from '../recognisers/recogniser.ts';
import { type LanguageVerb, verbOfWord } from '../verbs/verbWords.ts';

export type VerbPlace = { readonly at: number; readonly verb: LanguageVerb };

/** Where the verbs of a line stand. A ticker in back-ticks is no verb. */
export const verbPlaces = ({ words }: Line): readonly VerbPlace[] => {
  const places: VerbPlace[] = [];
  for (const [at, word] of words.entries()) {
    const verb = word.quoted ? null : verbOfWord(word.lower);
    if (verb !== null) places.push({ at, verb });
  }
  return places;
};
