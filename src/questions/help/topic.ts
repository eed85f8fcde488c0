import type { Verb } from '../question.ts';

/** What help says about one thing. Every example is a line that can be sent as it stands. */
export type HelpTopic = {
  /** What is typed after `help`, and what the topic is called in a question. */
  readonly name: string;
  /** Other words that ask for the same topic, in small letters; at most two words each. */
  readonly words: readonly string[];
  readonly title: string;
  /** What it is for, in one sentence. */
  readonly sentence: string;
  /** How it is written; brackets hold what may be left out. */
  readonly forms: readonly string[];
  readonly examples: readonly string[];
  readonly remarks: readonly string[];
};

export type VerbTopic = HelpTopic & { readonly name: Verb };

/** Something that is often asked for and not answered here. `nearest` says in a sentence what comes nearest. */
export type NotAskedTopic = HelpTopic & { readonly nearest: string; readonly nearestVerb: Verb };
