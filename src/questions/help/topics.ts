import { figureTopics } from './figureTopics.ts';
import { languageTopics } from './languageTopics.ts';
import { notAskedTopics } from './notAskedTopics.ts';
import { pinTopics } from './pinTopics.ts';
import { recordTopics } from './recordTopics.ts';
import { subscriptionTopics } from './subscriptionTopics.ts';
import { tailTopics } from './tailTopics.ts';
import type { HelpTopic, NotAskedTopic, VerbTopic } from './topic.ts';

export type { HelpTopic, NotAskedTopic, VerbTopic } from './topic.ts';

export const verbTopics: readonly VerbTopic[] = [
  ...figureTopics,
  ...tailTopics,
  ...subscriptionTopics,
  ...pinTopics,
  ...recordTopics,
];

export const helpTopics: readonly HelpTopic[] = [...verbTopics, ...languageTopics, ...notAskedTopics];

const byWord = <Topic extends HelpTopic>(topics: readonly Topic[]): ReadonlyMap<string, Topic> =>
  new Map(
    topics.flatMap((topic) => [topic.name, ...topic.words].map((word): [string, Topic] => [word, topic])),
  );

const topicsByWord = byWord(helpTopics);
const notAskedByWord = byWord(notAskedTopics);

export const topicWords: readonly string[] = [...topicsByWord.keys()];

/** The topic that is called so, by its name or one of its other words, in small letters. */
export const topicNamed = (words: string): HelpTopic | null => topicsByWord.get(words) ?? null;

/** The topic that says what comes nearest, where the word asks for something that is not answered. */
export const notAsked = (word: string): NotAskedTopic | null => notAskedByWord.get(word) ?? null;

/** Three questions for someone who has asked nothing yet. */
export const firstExamples: readonly string[] = ['interval KELP 60d', 'tail KELP at 99%', 'help'];

/** The page of `help` on its own: a line for each verb that can be asked now, and what cannot be asked. */
export const generalTopic = (builtVerbs: readonly string[]): HelpTopic => ({
  name: 'help',
  words: [],
  title: 'help',
  sentence: 'Ask how far a few dozen daily returns carry a claim: one verb a line, the rest in any order.',
  forms: verbTopics.filter(({ name }) => builtVerbs.includes(name)).map(({ title }) => title),
  examples: firstExamples,
  remarks: [
    'help VERB says how a question is written; help windows, dates, levels, sizes and typing explain its parts.',
    ...notAskedTopics.map(({ sentence, nearest }) => `${sentence} ${nearest}`),
  ],
});
