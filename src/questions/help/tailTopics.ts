import type { VerbTopic } from './topic.ts';

/** The verbs about losses. */
export const tailTopics: readonly VerbTopic[] = [
  {
    name: 'tail',
    words: ['var', 'es', 'beyond', 'losses', 'models'],
    title: 'tail: how bad a bad day is',
    sentence:
      'Gives VaR and ES by five models, each with its own uncertainty, or says how rare a daily loss is.',
    forms: [
      'tail TICKER [window] [at LEVEL] [confidence LEVEL] [over DAYS] [on AMOUNT] [by MODEL] [log]',
      'tail TICKER beyond SIZE [window] [confidence LEVEL] [on AMOUNT] [by MODEL] [log]',
    ],
    examples: [
      'tail KELP at 99% over 10d on 2m USD by student',
      'tail KELP beyond 4% 500d',
      'tail KELP at 97.5% on -500 shares',
    ],
    remarks: [
      'at is the level of the tail figure, confidence that of the interval around it.',
      'MODEL is historical, normal, student, filtered or peaks.',
      'A negative amount is a short position: the gains of the price are its losses.',
    ],
  },
  {
    name: 'shape',
    words: ['fat tails', 'skewness', 'kurtosis'],
    title: 'shape: how fat the tails are',
    sentence: 'Says how the returns differ from the bell curve, and how much more often large moves come.',
    forms: ['shape TICKER [window] [confidence LEVEL] [log]'],
    examples: ['shape KELP 2y', 'shape KELP all confidence 90%'],
    remarks: [],
  },
  {
    name: 'backtest',
    words: ['exceedances', 'traffic light'],
    title: 'backtest: did the tail figure hold up?',
    sentence:
      'Makes the tail figure for each past day from the returns before it, and counts the losses beyond it.',
    forms: ['backtest TICKER [window] [at LEVEL] [on window DAYS] [by MODEL] [log]'],
    examples: ['backtest KELP 250d at 99%', 'backtest KELP at 97.5% on window 500d by filtered'],
    remarks: [
      'The window holds the days that are judged; on window the returns behind each day’s figure.',
      'The working says how often such a test rejects by chance alone, as measured in simulations.',
    ],
  },
  {
    name: 'feed',
    words: ['tickers', 'data'],
    title: 'feed: how fresh and how clean the prices are',
    sentence: 'Says which tickers there are, up to which day, and what was found wrong with their prices.',
    forms: ['feed', 'feed TICKER'],
    examples: ['feed', 'feed KELP'],
    remarks: [],
  },
  {
    name: 'help',
    words: ['verbs', 'questions'],
    title: 'help: what can be asked',
    sentence:
      'Explains a verb, or a part of the language, or what comes nearest to something that cannot be asked.',
    forms: [
      'help',
      'help VERB',
      'help windows | levels | sizes | dates | typing',
      'help correlation | prices | direction',
    ],
    examples: ['help', 'help tail', 'help windows'],
    remarks: [],
  },
];
