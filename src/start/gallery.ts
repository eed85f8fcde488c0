import { resolve } from 'node:path';
import { openSqlite } from '../records/openSqlite.ts';
import { createConverse } from '../workspaces/converse.ts';
import { readArguments } from './arguments.ts';
import { computeInline } from './compute/inline.ts';
import { createDesk } from './desk.ts';
import { exitCodes } from './exit.ts';
import { feedOnce } from './feed.ts';
import { digestOf } from './gallery/digest.ts';
import { galleryQuestions } from './gallery/questions.ts';
import { screenOf } from './gallery/screen.ts';
import { writeGallery } from './gallery/writeGallery.ts';
import { drawInline } from './pictures/draw.ts';
import { versionsOf } from './records/records.ts';
import { settingsFor } from './settings.ts';
import { createSubscriptions } from './subscriptions/deskSubscriptions.ts';
import { createDigestPictures } from './subscriptions/digestPictures.ts';

const refuseWith = (problems: readonly { readonly message: string }[]): number => {
  for (const { message } of problems) process.stderr.write(`${message}\n`);
  return exitCodes.refused;
};

/** Writes every reply and picture for the settings' prices into a folder, to be looked at. */
const main = async (): Promise<number> => {
  const asked = readArguments(process.argv.slice(2));
  if ('wrong' in asked)
    return refuseWith([{ message: `${asked.wrong}. Write npm run gallery -- [--config FILE] [FOLDER].` }]);
  const reading = settingsFor(asked);
  if (!reading.ok) return refuseWith(reading.problems);
  const { settings } = reading;
  const clock = { nowMs: Date.now };
  const store = await openSqlite(null);
  if (!store.ok) return refuseWith([store.problem]);
  const tell = (message: string): void => void process.stderr.write(`${message}\n`);
  const records = { store: store.value, keeps: true, versions: versionsOf(settings), tell };
  const parts = { settings, clock, ...(await feedOnce(settings, clock)), compute: computeInline(), records };
  const subscriptions = createSubscriptions({ ...parts, store: store.value.subscriptions }).ofDesk;
  const drawing = drawInline();
  const converse = createConverse(createDesk({ ...parts, drawing, subscriptions }));
  const folder = resolve(asked.words[0] ?? 'gallery');
  const draw = createDigestPictures({ drawing, snapshot: parts.snapshot, tell });
  const posted = await digestOf(converse, subscriptions, draw);
  const page = await writeGallery(folder, converse, galleryQuestions, posted);
  await store.value.close();
  process.stdout.write(`${page}\n${await screenOf(page, `${folder}/screen.png`)}\n`);
  return exitCodes.answered;
};

main().then(
  (code) => {
    process.exitCode = code;
  },
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    process.exitCode = exitCodes.broken;
  },
);
