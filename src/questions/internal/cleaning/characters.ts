/** What each character becomes that a keyboard does not have but a chat platform or a phone puts in. */
const families: readonly (readonly [string, readonly number[]])[] = [
  // zero-width and direction marks, soft hyphen, variation selectors
  ['', [0xad, 0x61c, 0x180e, 0xfe0e, 0xfe0f, 0xfeff]],
  ['', range(0x200b, 0x200f)],
  ['', range(0x202a, 0x202e)],
  ['', range(0x2060, 0x206f)],
  [' ', [0x7f, 0xa0, 0x1680, 0x202f, 0x205f, 0x3000]],
  [' ', range(0x2000, 0x200a)],
  [' ', range(0x00, 0x09)],
  [' ', range(0x0b, 0x1f)],
  [' ', range(0x80, 0x9f)],
  ['\n', [0x0d, 0x85, 0x2028, 0x2029]],
  ["'", [0xb4, 0x2018, 0x2019, 0x201a, 0x201b, 0x2032]],
  ['"', [0xab, 0xbb, 0x201c, 0x201d, 0x201e, 0x201f, 0x2033]],
  ['-', range(0x2010, 0x2015)],
  ['-', [0x2212]],
];

function range(first: number, last: number): readonly number[] {
  return Array.from({ length: last - first + 1 }, (_, step) => first + step);
}

const plainForms: ReadonlyMap<number, string> = new Map(
  families.flatMap(([plain, codes]) => codes.map((code): [number, string] => [code, plain])),
);

/** The plain character for a UTF-16 code unit: empty where it goes, null where it stays as it is. */
export const plainForm = (code: number): string | null => plainForms.get(code) ?? null;
