import { mentionMark, readBracketed } from './angleBrackets.ts';
import { plainForm } from './characters.ts';
import { createMappedWriter, type MappedText, type MappedWriter } from './mappedText.ts';

const entities = [
  ['&amp;', '&'],
  ['&lt;', '<'],
  ['&gt;', '>'],
] as const;

/** Writes text that holds no `<…>`: entities are undone once, typographic characters become plain ones. */
const writePlain = (writer: MappedWriter, text: string, origin: number): void => {
  const special = /[^\x20-\x7e\n]|&/g;
  let written = 0;
  for (let match = special.exec(text); match !== null; match = special.exec(text)) {
    const at = match.index;
    const entity = match[0] === '&' ? entities.find(([name]) => text.startsWith(name, at)) : undefined;
    const plain = entity === undefined ? plainForm(text.charCodeAt(at)) : entity[1];
    if (plain === null) continue;
    writer.write(text.slice(written, at), origin + written);
    // of a carriage return and a line feed only the line feed is kept
    writer.write(match[0] === '\r' && text[at + 1] === '\n' ? '' : plain, origin + at);
    written = at + (entity?.[0].length ?? 1);
    special.lastIndex = written;
  }
  writer.write(text.slice(written), origin + written);
};

const writeBracketed = (
  writer: MappedWriter,
  inside: string,
  origin: number,
  ownId: string | null,
): boolean => {
  const bracketed = readBracketed(inside);
  if (bracketed === null) return false;
  if (bracketed.kind === 'link') {
    writePlain(writer, bracketed.shown, origin + bracketed.offset);
    return true;
  }
  const addressesBot = bracketed.id === ownId || (inside.startsWith('@') && !writer.hasWords());
  writer.write(addressesBot ? ' ' : ` ${mentionMark} `, origin);
  return true;
};

const bracketPattern = /<([^<>\n]*)>/g;

/** Undoes what the platform made of the typed characters. A mention at the head, and the bot's own anywhere, go. */
export const undoPlatformText = (text: string, ownId: string | null): MappedText => {
  const writer = createMappedWriter();
  // where mentions are not marked up, a name at the head is the address
  let written = /^\s*@\S*/.exec(text)?.[0].length ?? 0;
  for (const match of text.matchAll(bracketPattern)) {
    if (match.index < written) continue;
    writePlain(writer, text.slice(written, match.index), written);
    const end = match.index + match[0].length;
    const undone = writeBracketed(writer, match[1] ?? '', match.index + 1, ownId);
    if (!undone) writePlain(writer, match[0], match.index);
    written = end;
  }
  writePlain(writer, text.slice(written), written);
  return writer.finish();
};
