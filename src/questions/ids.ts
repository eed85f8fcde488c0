/** Ten characters; more where two answers would share the ten. */
const recordPattern = /^r-([0-9abcdefghjkmnpqrstvwxyz]{10,20})$/;
const subscriptionPattern = /^([dw])-([1-9]\d{0,8})$/;

/** Crockford's base32 reads what is easily mistaken: O is 0, I and L are 1. */
const withoutMistakes = (characters: string): string => characters.replace(/o/g, '0').replace(/[il]/g, '1');

/** The id of a recorded answer in its one form, such as `R-7Q2M9K4TXD`, whatever case and likeness it was typed with. */
export const readRecordId = (text: string): string | null => {
  const lower = text.toLowerCase();
  if (!lower.startsWith('r-')) return null;
  const characters = recordPattern.exec(`r-${withoutMistakes(lower.slice(2))}`)?.[1];
  return characters === undefined ? null : `R-${characters.toUpperCase()}`;
};

/** The id of a digest (`D-12`) or a watch (`W-7`). */
export const readSubscriptionId = (text: string): string | null => {
  const parts = subscriptionPattern.exec(text.toLowerCase());
  return parts === null ? null : `${(parts[1] ?? '').toUpperCase()}-${parts[2] ?? ''}`;
};
