import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { toBlocks } from '../../present/blocks.ts';
import { toText } from '../../present/text.ts';
import type { Converse, Spoken } from '../../workspaces/converse.ts';
import { type Exhibit, galleryPage } from './page.ts';

const terminalWidth = 100;

const writePictures = async (
  folder: string,
  place: number,
  { pictures = [] }: Spoken,
): Promise<Exhibit['replies'][number]['pictures']> =>
  Promise.all(
    pictures.map(async ({ png, fileName, altText }) => {
      const file = `${String(place + 1).padStart(2, '0')}-${fileName}`;
      await writeFile(join(folder, file), png);
      return { file, altText };
    }),
  );

/** What is posted without being asked for. */
export type Posted = { readonly title: string; readonly spoken: Spoken };

/** Asks every question and writes what is said, picture by picture, with a page that shows it all; the page. */
export const writeGallery = async (
  folder: string,
  converse: Pick<Converse, 'ask'>,
  questions: readonly string[],
  posted: readonly Posted[] = [],
): Promise<string> => {
  await mkdir(folder, { recursive: true });
  const exhibits: Exhibit[] = [];
  const exhibit = async (question: string, spoken: readonly Spoken[]): Promise<void> => {
    const replies = [];
    for (const each of spoken)
      replies.push({
        text: toText(each.reply, { width: terminalWidth }),
        message: toBlocks(each.reply),
        pictures: await writePictures(folder, exhibits.length, each),
      });
    exhibits.push({ question, replies });
  };
  for (const question of questions)
    await exhibit(question, await converse.ask({ text: question, place: 'channel' }));
  for (const { title, spoken } of posted) await exhibit(title, [spoken]);
  const page = join(folder, 'index.html');
  await writeFile(page, galleryPage(exhibits));
  return page;
};
