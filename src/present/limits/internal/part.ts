/** A block, an element or a text object of a message, before anything is known of it. */
export type Part = Readonly<Record<string, unknown>>;

export const isPart = (value: unknown): value is Part =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

export const partsOf = (value: unknown): readonly Part[] =>
  Array.isArray(value) ? value.filter(isPart) : [];

export const kindOf = (part: Part): string => (typeof part['type'] === 'string' ? part['type'] : 'nothing');

/** The words in a text object, or a bare text; null where there is neither. */
export const wordsIn = (value: unknown): string | null => {
  const text = isPart(value) ? value['text'] : value;
  return typeof text === 'string' ? text : null;
};

/** A text that is there has to hold at least one character and at most so many. */
export const lengthFaults = (where: string, value: unknown, most: number): readonly string[] => {
  if (value === undefined) return [];
  const text = wordsIn(value);
  if (text === null) return [`${where} is no text`];
  if (text.length === 0) return [`${where} is empty`];
  return text.length > most ? [`${where} has ${text.length} characters, ${most} at most`] : [];
};

export const neededFaults = (where: string, value: unknown, most: number): readonly string[] =>
  value === undefined ? [`${where} is missing`] : lengthFaults(where, value, most);

export const countFaults = (where: string, value: unknown, most: number): readonly string[] => {
  const count = Array.isArray(value) ? value.length : 0;
  if (count === 0) return [`${where} has none`];
  return count > most ? [`${where} has ${count}, ${most} at most`] : [];
};

/** What is read as plain text only: markup in it would be shown as it stands. */
export const plainFaults = (where: string, value: unknown): readonly string[] =>
  isPart(value) && kindOf(value) !== 'plain_text' ? [`${where} is not plain text`] : [];
