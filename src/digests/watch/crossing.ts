/** Where a watched figure stands against its line, and for how many sessions it has been back on the quiet side. */
export type Stand = { readonly crossed: boolean; readonly calmSessions: number };

export type Step = { readonly stand: Stand; readonly event: 'fired' | 'cleared' | null };

/** So many sessions on the other side in a row, before it counts as over. */
const sessionsToClear = 2;

/**
 * One session later. It fires when the line is crossed, stays quiet while the figure is beyond it, and clears after two
 * sessions in a row on the other side; one such session alone changes nothing, so that a figure on its line is not
 * heard every day.
 */
export const nextStand = ({ crossed, calmSessions }: Stand, beyond: boolean): Step => {
  if (beyond) return { stand: { crossed: true, calmSessions: 0 }, event: crossed ? null : 'fired' };
  if (!crossed) return { stand: { crossed: false, calmSessions: 0 }, event: null };
  const calm = calmSessions + 1;
  return calm >= sessionsToClear
    ? { stand: { crossed: false, calmSessions: 0 }, event: 'cleared' }
    : { stand: { crossed: true, calmSessions: calm }, event: null };
};

/** Strictly beyond: a figure on its line has not crossed it. */
export const isBeyond = (value: number, line: number, side: 'above' | 'below'): boolean =>
  side === 'above' ? value > line : value < line;
