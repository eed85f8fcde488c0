import { type Reply, reply } from '../reply.ts';

/** One page of help as it is told: what it is for, how it is written, examples ready to send. */
export type HelpPage = {
  readonly title: string;
  readonly sentence: string;
  readonly forms: readonly string[];
  readonly examples: readonly string[];
  readonly remarks: readonly string[];
};

/** The caution in full, shown in help. */
export const fullCaution =
  'Everything here rests on past prices and stated assumptions; markets can do what they have never done. It is no ' +
  'investment advice and no recommendation. The desk’s own policy and limits decide, and where a decision needs advice, ' +
  'licensed advisers and the rules of the place do. A figure is only as good as the price file under it.';

const passage = (head: string, lines: readonly string[]) => (lines.length === 0 ? [] : [{ head, lines }]);

export const helpReply = (page: HelpPage): Reply =>
  reply('help', page.sentence, {
    passages: [
      ...passage('How to ask', page.forms),
      ...passage('Examples', page.examples),
      ...passage('Good to know', page.remarks),
    ],
    caution: fullCaution,
  });
