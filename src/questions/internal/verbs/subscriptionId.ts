import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { allOf, firstOf, type PieceKind } from '../pieces/piece.ts';
import { faultAtPiece, missing, type VerbLine } from './verbReader.ts';

/** What a digest and a watch differ in here. */
export type Named = { readonly noun: 'digest' | 'watch'; readonly letter: 'D' | 'W' };

/** The id that something is to be done with. */
export const idOf = (line: VerbLine, { noun, letter }: Named): Attempt<string> => {
  const [placed] = allOf(line.pieces, 'subscriptionId');
  const doing = firstOf(line.pieces, 'doing')?.doing ?? '';
  if (placed === undefined) {
    const message = `${noun} ${doing} needs the id of a ${noun}, such as ${letter}-12. ${noun} list shows them.`;
    const whole = [{ first: 0, wordCount: line.words.length, text: `${noun} list` }];
    return faulty({ ...missing(line, message, []), repairs: [whole] });
  }
  if (placed.piece.id.startsWith(letter)) return attained(placed.piece.id);
  const other = letter === 'D' ? 'watch' : 'digest';
  const says = `is no ${noun}. Write ${other} ${doing} and the id.`;
  const whole = [{ first: 0, wordCount: line.words.length, text: `${other} ${doing} ${placed.piece.id}` }];
  return faulty({
    ...faultAtPiece(line, placed, { code: 'notForVerb', says, instead: [] }),
    repairs: [whole],
  });
};

/** Refuses what stands in the line beside the few kinds that this has a use for. */
export const onlyThese = (line: VerbLine, kinds: ReadonlySet<PieceKind>, what: string): Attempt<null> => {
  const passed: ReadonlySet<PieceKind> = new Set(['verb', 'filler', 'doing']);
  const other = line.pieces.find(({ piece }) => !passed.has(piece.kind) && !kinds.has(piece.kind));
  if (other === undefined) return attained(null);
  const says = `does not go with ${what}. Leave it out.`;
  return faulty(faultAtPiece(line, other, { code: 'notForVerb', says, instead: [''] }));
};

/** An id of a thing with nothing said to be done with it. */
export const nothingToDo = (line: VerbLine, { noun }: Named): Attempt<null> => {
  const [placed] = allOf(line.pieces, 'subscriptionId');
  if (placed === undefined) return attained(null);
  const doings = noun === 'digest' ? ['now', 'pause', 'stop'] : ['pause', 'stop'];
  const says = `is there already, and what to do with it is not said. Write ${noun} ${doings.join(', ')} or another word before it.`;
  const instead = doings.map((doing) => `${doing} ${placed.piece.id}`);
  return faulty(faultAtPiece(line, placed, { code: 'missingPart', says, instead }));
};
