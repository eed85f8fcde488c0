/** Every verb of the language, in the order in which help lists them. */
export const languageVerbs = [
  'interval',
  'tail',
  'shape',
  'claim',
  'need',
  'compare',
  'backtest',
  'book',
  'digest',
  'watch',
  'pin',
  'unpin',
  'again',
  'records',
  'feed',
  'help',
] as const;

export type LanguageVerb = (typeof languageVerbs)[number];

/** The names of the two tail figures, by which the trade asks for them. */
const tailFigures: ReadonlyMap<string, string> = new Map([
  ['var', 'VaR'],
  ['es', 'ES'],
]);

const verbsByWord: ReadonlyMap<string, LanguageVerb> = new Map([
  ...languageVerbs.map((verb): [string, LanguageVerb] => [verb, verb]),
  ...Array.from(tailFigures.keys(), (word): [string, LanguageVerb] => [word, 'tail']),
]);

export const verbOfWord = (lower: string): LanguageVerb | null => verbsByWord.get(lower) ?? null;

export const verbWords: readonly string[] = [...verbsByWord.keys()];

/** `VaR read as tail`, for a word that only stands for a verb; null for the verb itself. */
export const stoodFor = (lower: string): string | null => {
  const figure = tailFigures.get(lower);
  return figure === undefined ? null : `${figure} read as tail`;
};

/** After these a second verb says what to explain or what to watch. */
export const takesAnotherVerb = (verb: LanguageVerb): boolean => verb === 'help' || verb === 'watch';
