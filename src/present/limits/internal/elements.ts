import { platformLimits as limits } from '../platformLimits.ts';
import {
  countFaults,
  isPart,
  kindOf,
  lengthFaults,
  neededFaults,
  type Part,
  partsOf,
  plainFaults,
} from './part.ts';

type Check = (element: Part, where: string) => readonly string[];

const confirmFaults: Check = (element, where) => {
  const confirm = element['confirm'];
  if (!isPart(confirm)) return [];
  return [
    ...neededFaults(`${where} confirm title`, confirm['title'], limits.confirm.title),
    ...neededFaults(`${where} confirm text`, confirm['text'], limits.confirm.text),
    ...neededFaults(`${where} confirm button`, confirm['confirm'], limits.confirm.button),
    ...neededFaults(`${where} deny button`, confirm['deny'], limits.confirm.button),
  ];
};

const optionFaults = (options: unknown, where: string): readonly string[] =>
  partsOf(options).flatMap((option, index) => [
    ...neededFaults(`${where} option ${index + 1}`, option['text'], limits.select.optionText),
    ...neededFaults(`${where} option ${index + 1} value`, option['value'], limits.select.optionValue),
    ...lengthFaults(
      `${where} option ${index + 1} description`,
      option['description'],
      limits.select.optionText,
    ),
  ]);

const optionsFaults = (element: Part, where: string, most: number): readonly string[] => [
  ...countFaults(`${where} options`, element['options'], most),
  ...optionFaults(element['options'], where),
];

const placeholderFaults: Check = (element, where) => [
  ...lengthFaults(`${where} placeholder`, element['placeholder'], limits.select.placeholder),
  ...plainFaults(`${where} placeholder`, element['placeholder']),
];

const button: Check = (element, where) => [
  ...neededFaults(`${where} text`, element['text'], limits.button.text),
  ...plainFaults(`${where} text`, element['text']),
  ...lengthFaults(`${where} value`, element['value'], limits.button.value),
  ...lengthFaults(`${where} url`, element['url'], limits.button.url),
  ...lengthFaults(`${where} label`, element['accessibility_label'], limits.button.accessibilityLabel),
];

const textInput: Check = (element, where) => {
  const longest = element['max_length'];
  const tooLong = typeof longest === 'number' && longest > limits.input.maxLength;
  return [
    ...(tooLong ? [`${where} takes up to ${longest} characters`] : []),
    ...placeholderFaults(element, where),
  ];
};

/** Figures about a picture, as a block and as an element. */
export const pictureFaults: Check = (picture, where) => {
  const shows = picture['image_url'] !== undefined || picture['slack_file'] !== undefined;
  return [
    ...(shows ? [] : [`${where} shows no picture`]),
    ...neededFaults(`${where} alt text`, picture['alt_text'], limits.image.altText),
    ...lengthFaults(`${where} title`, picture['title'], limits.image.title),
    ...lengthFaults(`${where} address`, picture['image_url'], limits.image.url),
  ];
};

const byKind: Readonly<Record<string, Check>> = {
  button,
  overflow: (element, where) => optionsFaults(element, where, limits.overflow.options),
  static_select: (element, where) => [
    ...optionsFaults(element, where, limits.select.options),
    ...placeholderFaults(element, where),
  ],
  external_select: placeholderFaults,
  conversations_select: placeholderFaults,
  checkboxes: (element, where) => optionsFaults(element, where, limits.checkboxes.options),
  plain_text_input: textInput,
  image: pictureFaults,
  plain_text: (element, where) => neededFaults(where, element['text'], limits.section.text),
  mrkdwn: (element, where) => neededFaults(where, element['text'], limits.section.text),
};

/** What is wrong with one element of a block. */
export const elementFaults = (element: Part, where: string): readonly string[] => {
  const check = byKind[kindOf(element)];
  if (check === undefined) return [`${where} is of a kind that is not known: ${kindOf(element)}`];
  return [
    ...check(element, where),
    ...lengthFaults(`${where} action id`, element['action_id'], limits.ids.actionId),
    ...confirmFaults(element, where),
  ];
};
