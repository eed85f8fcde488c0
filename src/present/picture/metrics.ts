/**
 * How wide a text is, without a canvas to measure it on. Advance widths of DejaVu Sans Condensed 2.37, in 2048ths of the
 * font size, read from the font's own tables (hmtx); kerning, which only narrows, is left out.
 */
const unitsPerEm = 2048;

/** Space to tilde, in the order of their codes. */
const advances = [
  585, 738, 847, 1544, 1172, 1751, 1437, 506, 719, 719, 921, 1544, 585, 665, 585, 621, 1172, 1172, 1172, 1172,
  1172, 1172, 1172, 1172, 1172, 1172, 621, 621, 1544, 1544, 1544, 978, 1843, 1260, 1264, 1287, 1419, 1164,
  1060, 1428, 1386, 543, 543, 1208, 1026, 1590, 1378, 1450, 1111, 1450, 1280, 1170, 1125, 1349, 1260, 1822,
  1262, 1125, 1262, 719, 621, 719, 1544, 921, 921, 1129, 1170, 1013, 1170, 1134, 648, 1170, 1168, 512, 512,
  1067, 512, 1795, 1168, 1127, 1170, 1170, 757, 960, 722, 1168, 1090, 1507, 1090, 1090, 967, 1172, 621, 1172,
  1544,
] as const;
const firstCode = 32;

/** The signs that pictures use beyond them: minus, times, plus-minus, dashes, quotes, dot. */
const further: Readonly<Record<string, number>> = {
  '−': 1544,
  '×': 1544,
  '±': 1544,
  '–': 921,
  '—': 1843,
  '’': 585,
  '“': 954,
  '”': 954,
  '·': 585,
  '…': 1843,
};
/** A letter outside the table counts as a wide one, so that room is left rather than lacking. */
const unknownAdvance = 1544;
/** The bold cut is at most this much wider, letter by letter, in texts of letters and digits. */
const boldFactor = 1.13;

const advanceOf = (letter: string): number =>
  advances[letter.charCodeAt(0) - firstCode] ?? further[letter] ?? unknownAdvance;

export type Lettering = { readonly fontSize: number; readonly bold?: boolean };

export const textWidth = (text: string, { fontSize, bold = false }: Lettering): number => {
  let units = 0;
  for (const letter of text) units += advanceOf(letter);
  return (units / unitsPerEm) * fontSize * (bold ? boldFactor : 1);
};

/** Lines no wider than the room, broken between words; a word wider than that stands alone. */
export const wrapped = (text: string, room: number, lettering: Lettering): readonly string[] => {
  const lines: string[] = [];
  for (const word of text.split(' ')) {
    const last = lines.at(-1);
    const longer = last === undefined ? word : `${last} ${word}`;
    if (last !== undefined && textWidth(longer, lettering) <= room) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines;
};
