import type { VerbTopic } from './topic.ts';

/** The verbs about results at the head of a discussion. */
export const pinTopics: readonly VerbTopic[] = [
  {
    name: 'pin',
    words: ['pinned', 'pins', 'card'],
    title: 'pin: keep a result at the head of the discussion',
    sentence: 'Posts a card with a result in its thread and pins it, so that whoever comes later finds it.',
    forms: ['pin', 'pin ID'],
    examples: ['pin', 'pin R-7Q2M9K4TXD'],
    remarks: [
      'pin alone takes the last result of the thread in which it is written; the button under a reply takes that one.',
      'When there are new days of prices, or those behind a card were restated, its thread is told once.',
    ],
  },
  {
    name: 'unpin',
    words: ['take off'],
    title: 'unpin: take a result off again',
    sentence: 'Takes the pin off a card; the card stays where it stands in the thread.',
    forms: ['unpin', 'unpin ID'],
    examples: ['unpin', 'unpin R-7Q2M9K4TXD'],
    remarks: ['unpin alone takes off the last card of the thread in which it is written.'],
  },
];
