/**
 * A reply before it takes the shape of a terminal or a workspace: what stands in it, in which order. Every word is plain
 * text; nothing in it is markup anywhere.
 */
export type Table = {
  readonly columns: readonly { readonly head: string; readonly align: 'left' | 'right' }[];
  readonly rows: readonly (readonly string[])[];
};

/** A list of steps or of paragraphs under an optional head of its own. */
export type Passage = { readonly head: string | null; readonly lines: readonly string[] };

/** What pressing a button asks for. All are plain words: each does what its name says to the answer or subscription under it. */
export const buttonActions = [
  'working',
  'more',
  'level',
  'picture',
  'pin',
  'share',
  'pauseSubscription',
  'resumeSubscription',
  'stopSubscription',
] as const;

export type ButtonAction = (typeof buttonActions)[number];

export type Button = {
  readonly action: ButtonAction;
  readonly label: string;
  /** The answer, digest or watch that the button is about. */
  readonly answerId: string;
  /** The canonical question, so that a press can be served while the store of records is in trouble. */
  readonly question: string;
  /** Words that the press adds to the question, such as `at 99%`. */
  readonly added?: string;
};

export type Reply = {
  readonly kind: 'answer' | 'refusal' | 'help' | 'feed' | 'working' | 'record';
  /** One sentence to act on, verdict first. */
  readonly sentence: string;
  readonly table: Table | null;
  /** The same figures in words, for a notification and a screen reader. */
  readonly figuresInWords: string;
  readonly passages: readonly Passage[];
  readonly warnings: readonly string[];
  /** Data date, returns, method, id. */
  readonly quietLine: string | null;
  readonly caution: string | null;
  readonly buttons: readonly Button[];
  /** Where all of it is to be had, said where a medium has room for a part only. */
  readonly whole: string | null;
};

/** The caution at the foot of every answer; the full text stands in help. */
export const caution = 'Past prices under stated assumptions, not investment advice; desk policy decides.';

/** Warnings beyond this many wait under the button. */
export const warningsShown = 2;

const blank: Omit<Reply, 'kind' | 'sentence'> = {
  table: null,
  figuresInWords: '',
  passages: [],
  warnings: [],
  quietLine: null,
  caution: null,
  buttons: [],
  whole: null,
};

export const reply = (
  kind: Reply['kind'],
  sentence: string,
  parts: Partial<Omit<Reply, 'kind' | 'sentence'>> = {},
): Reply => ({ ...blank, ...parts, kind, sentence });
