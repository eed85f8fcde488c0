import { type Reply, reply } from '../../src/present/reply.ts';

/** A reply with every part, in words that try to be markup. */
export const fullReply: Reply = reply('answer', 'KELP & <TARN> of @here: see http://example.org #desk.', {
  table: {
    columns: [
      { head: '% a day', align: 'left' },
      { head: 'estimate', align: 'right' },
      { head: 'from', align: 'right' },
    ],
    rows: [
      ['Mean', '+0.06', '−0.21'],
      ['Standard deviation', '1.05', ''],
    ],
  },
  figuresInWords: 'A year of such days: +15%',
  passages: [{ head: 'Notes', lines: ['First *note*.', 'Second note.'] }],
  warnings: ['one thing is off', 'another is too', 'and a third'],
  quietLine: 'Data to 2026-11-27, 60 simple returns, R-7Q2M9K4TXD',
  caution: 'Desk policy decides.',
  buttons: [
    {
      action: 'working',
      label: 'Show the working',
      answerId: 'R-7Q2M9K4TXD',
      question: 'interval KELP 60d at 95%',
    },
  ],
});
