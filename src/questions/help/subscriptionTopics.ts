import type { VerbTopic } from './topic.ts';

/** The verbs about what is posted without being asked anew. */
export const subscriptionTopics: readonly VerbTopic[] = [
  {
    name: 'digest',
    words: ['digests', 'schedule', 'schedules', 'morning'],
    title: 'digest: the figures of your tickers, posted by themselves',
    sentence:
      'Posts one line per ticker on a schedule: last return, VaR and ES with their intervals, what changed, and how often the figure was exceeded.',
    forms: [
      'digest [DAYS] [TIME] [ZONE] TICKER ... [WINDOW] [LEVEL] [by MODEL]',
      'DAYS: sessions (default), weekdays, daily, mon,thu, month start, month end',
      'TIME: 08:30, 8.30, 8:30am; ZONE: an IANA time zone, or a city that the desk has named',
      'digest list',
      'digest now, pause, resume or stop ID; digest now ID as picture',
      'digest change ID and what is to be another way',
    ],
    examples: [
      'digest sessions 08:30 KELP TARN at 99%',
      'digest mon,thu 7:45am Europe/London KELP',
      'digest list',
      'digest change D-12 09:00',
    ],
    remarks: [
      'A session is a weekday that the holiday file does not name; without that file every weekday counts, and digest list says so.',
      'If closes are missing at the hour it waits a while, then posts and says how old the prices are; the fresh line follows in its thread.',
      'It is posted where it was made. Who made it owns it; anybody who may ask there may pause it.',
      'Past prices under stated assumptions, not investment advice; desk policy decides.',
    ],
  },
  {
    name: 'watch',
    words: ['watches', 'alert', 'alerts'],
    title: 'watch: be told when a line is crossed',
    sentence:
      'Looks once at each new session and says so when a tail figure crosses a line, or a loss passes it.',
    forms: [
      'watch TICKER tail or ES [WINDOW] [LEVEL] [by MODEL] above or below LOSS',
      'watch TICKER loss beyond tail [WINDOW] [LEVEL] [by MODEL]',
      'watch list',
      'watch pause, resume or stop ID',
    ],
    examples: ['watch KELP tail 99% above 4%', 'watch KELP loss beyond tail', 'watch list', 'watch stop W-7'],
    remarks: [
      'It speaks when the line is crossed and again once the figure has been two sessions on the other side; at most once a session.',
      'A loss is held against the figure of the session before, never one that contains the day itself.',
      'Past prices that are restated do not set it off; its next message mentions them.',
    ],
  },
];
