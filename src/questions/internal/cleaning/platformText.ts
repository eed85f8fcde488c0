import { type Bracketed, mentionMark, readBracketed } from './angleBrackets.ts';
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

const writeBracketed = (writer: MappedWriter, bracketed: Bracketed, origin: number): void => {
  if (bracketed.kind === 'link') writePlain(writer, bracketed.shown, origin + bracketed.offset);
  else writer.write(` ${mentionMark} `, origin);
};

const bracketPattern = /<([^<>\n]*)>/g;

/** What addresses the message: a mention at the head, or a name where mentions are not marked up. */
const addressPattern = /^\s*(?:<@[^<>\n]*>|@\S*)/;

/** Undoes what the platform made of the typed characters. The address at the head goes, and the bot's own mention anywhere. */
export const undoPlatformText = (text: string, ownId: string | null): MappedText => {
  const writer = createMappedWriter();
  let written = addressPattern.exec(text)?.[0].length ?? 0;
  for (const match of text.matchAll(bracketPattern)) {
    const bracketed = match.index < written ? null : readBracketed(match[1] ?? '');
    if (bracketed === null) continue;
    writePlain(writer, text.slice(written, match.index), written);
    if (bracketed.kind === 'link' || bracketed.id !== ownId)
      writeBracketed(writer, bracketed, match.index + 1);
    written = match.index + match[0].length;
  }
  writePlain(writer, text.slice(written), written);
  return writer.finish();
};
