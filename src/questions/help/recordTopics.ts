import type { VerbTopic } from './topic.ts';

/** The verbs about answers on record. */
export const recordTopics: readonly VerbTopic[] = [
  {
    name: 'again',
    words: ['recompute', 'reproduce'],
    title: 'again: recompute an answer on record',
    sentence:
      'Works an answer out again from the prices kept with it, then on the prices of today; with two ids, says how they differ.',
    forms: ['again ID', 'again ID ID'],
    examples: ['again R-7Q2M9K4TXD', 'again R-7Q2M9K4TXD R-3FHW8N0ZQC'],
    remarks: ['The id stands below each answer; records lists them.'],
  },
  {
    name: 'records',
    words: ['record', 'on record'],
    title: 'records: answers on record',
    sentence:
      'Lists the answers that were given, the newest first, or examines whether they are as they were kept.',
    forms: ['records [TICKER] [since DATE]', 'records verify'],
    examples: ['records', 'records KELP since 2026-05-04', 'records verify'],
    remarks: [
      'An answer is kept with its figures and the prices that it used, and each time that it was asked with who asked, where and in which words.',
    ],
  },
];
