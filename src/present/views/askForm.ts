import { platformLimits as limits } from '../limits/platformLimits.ts';
import { type Option, options, quiet, type View, words } from './parts.ts';

export const askFormId = 'ask';

/** The fields of the form; each is a block, and its element has the same name. */
export const askFields = ['verb', 'ticker', 'window', 'level', 'place'] as const;
export type AskField = (typeof askFields)[number];

export type AskFormParts = {
  /** What can be asked with a ticker alone: words of the language, with what they ask. */
  readonly verbs: readonly Option[];
  readonly levels: readonly Option[];
  /** The question that the fields make, or what is wrong with them. */
  readonly note: string;
};

const label = (text: string) => words(text, limits.input.label);

const field = (name: AskField, title: string, element: object, more: object = {}) => ({
  type: 'input',
  block_id: name,
  label: label(title),
  dispatch_action: true,
  element: { action_id: name, ...element },
  ...more,
});

const tickerField = field('ticker', 'Ticker', {
  type: 'external_select',
  min_query_length: 1,
  placeholder: words('Type its first letters', limits.select.placeholder),
});

const windowField = field(
  'window',
  'Window',
  {
    type: 'plain_text_input',
    dispatch_action_config: { trigger_actions_on: ['on_character_entered'] },
    placeholder: words('such as 60d, 3m, ytd, since 2026-05-04', limits.select.placeholder),
  },
  { optional: true, hint: words('Left empty, the desk’s own window is taken.', limits.input.hint) },
);

const placeField = {
  ...field('place', 'Answer in', {
    type: 'conversations_select',
    default_to_current_conversation: true,
    response_url_enabled: true,
    filter: { include: ['public', 'private', 'im'], exclude_bot_users: true },
  }),
  hint: words('Where the bot is no member its answer can be posted, but not pinned.', limits.input.hint),
};

const selectField = (name: AskField, title: string, all: readonly Option[], more: object = {}) =>
  field(name, title, { type: 'static_select', options: options(all, limits.select.options), ...more });

/** The form of the global shortcut: verb, ticker, window, level, and where the answer goes. */
export const askForm = ({ verbs, levels, note }: AskFormParts): View => {
  const [first] = options(verbs, 1);
  return {
    type: 'modal',
    callback_id: askFormId,
    title: words('Ask', limits.view.title),
    submit: words('Ask', limits.view.submitLabel),
    close: words('Leave', limits.view.closeLabel),
    blocks: [
      selectField('verb', 'What', verbs, first === undefined ? {} : { initial_option: first }),
      tickerField,
      windowField,
      { ...selectField('level', 'Level', levels), optional: true },
      placeField,
      { ...quiet(note), block_id: 'note' },
    ],
  };
};

/** The tickers that a type-ahead offers, in the form that the platform takes. */
export const tickerOptions = (tickers: readonly string[]) =>
  options(
    tickers
      .filter((ticker) => ticker.length <= limits.select.optionText)
      .map((ticker) => ({ text: ticker, value: ticker })),
    limits.select.options,
  );
