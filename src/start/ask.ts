import { answersToJson, problemToJson } from '../present/json.ts';
import { toText } from '../present/text.ts';
import { inWords } from '../present/words.ts';
import type { Problem } from '../terms/problem.ts';
import { problem } from '../terms/problem.ts';
import { createConverse, type Spoken } from '../workspaces/converse.ts';
import { type Arguments, readArguments } from './arguments.ts';
import { computeInline } from './compute/inline.ts';
import { createDesk } from './desk.ts';
import { exitCodes } from './exit.ts';
import { feedOnce } from './feed.ts';
import { drawInline } from './pictures/draw.ts';
import { savePicture } from './pictures/save.ts';
import { recordsToKeep, recordsToRead, versionsOf } from './records/records.ts';
import { settingsFor } from './settings.ts';
import { createSubscriptions } from './subscriptions/deskSubscriptions.ts';

const usage =
  'npm run --silent ask -- [--config FILE] [--feed FILE] [--records FILE] [--keep] [--json] [--picture FILE] "QUESTION"';

const print = (text: string): void => {
  process.stdout.write(`${text}\n`);
};

const refuseWith = (found: readonly Problem[], json: boolean): number => {
  for (const each of found) {
    const hint = each.suggestion === null ? '' : `\nTry: ${each.suggestion}`;
    process.stderr.write(`${json ? problemToJson(each) : `${each.message}${hint}`}\n`);
  }
  return exitCodes.refused;
};

/** A question whose picture goes to a file asks for it, whether or not its words do. */
const withWish = (question: string, { picture }: Arguments): string =>
  picture === null || /\bas picture\b/i.test(question) ? question : `${question} as picture`;

/** Writes the pictures, the first to the file that was named, and says where they are; a document of JSON is left alone. */
const save = async (spoken: readonly Spoken[], { picture, json }: Arguments): Promise<Problem | null> => {
  const pictures = spoken.flatMap(({ pictures: some = [] }) => some);
  for (const [place, each] of pictures.entries()) {
    const saved = await savePicture(each, place === 0 ? picture : null);
    if (!saved.ok) return saved.problem;
    if (!json) print(`\nPicture: ${saved.value}`);
  }
  return null;
};

/** Answers in text one below the other; as JSON in one document. */
const show = (spoken: readonly Spoken[], json: boolean): void => {
  const answers = spoken.flatMap(({ outcome }) => (outcome?.ok === true ? outcome.value : []));
  if (json && answers.length > 0) print(answersToJson(answers));
  else if (json)
    print(JSON.stringify({ ok: true, text: spoken.map(({ reply }) => inWords(reply)).join('\n\n') }));
  else
    print(
      spoken
        .map(({ reply }) => toText({ ...reply, buttons: [] }, { width: process.stdout.columns ?? 100 }))
        .join('\n\n'),
    );
};

const ask = async (asked: Arguments): Promise<number> => {
  const question = asked.words.join(' ').trim();
  if (question === '')
    return refuseWith(
      [problem('noVerb', `No question was given. Write ${usage}, for example "interval KELP 60d".`)],
      asked.json,
    );
  const reading = settingsFor(asked);
  if (!reading.ok) return refuseWith(reading.problems, asked.json);
  const clock = { nowMs: Date.now };
  const feed = await feedOnce(reading.settings, clock);
  const store = asked.keep ? recordsToKeep(reading.settings) : recordsToRead(reading.settings);
  const { settings } = reading;
  const records = {
    store,
    keeps: asked.keep,
    versions: versionsOf(settings),
    tell: (message: string) => process.stderr.write(`${message}\n`),
  };
  const parts = { settings, clock, ...feed, compute: computeInline(), records };
  const subscriptions = createSubscriptions({ ...parts, store: store.subscriptions }).ofDesk;
  const desk = createDesk({ ...parts, drawing: drawInline(), subscriptions });
  const spoken = await createConverse(desk).ask({
    text: withWish(question, asked),
    place: 'terminal',
  });
  await store.close();
  const problems = spoken.flatMap(({ outcome }) => (outcome?.ok === false ? [outcome.problem] : []));
  if (problems.length > 0 || spoken.length === 0)
    return refuseWith(
      problems.length > 0
        ? problems
        : [problem('noVerb', 'No question was read. Ask for example "interval KELP 60d".')],
      asked.json,
    );
  show(spoken, asked.json);
  const unwritten = await save(spoken, asked);
  return unwritten === null ? exitCodes.answered : refuseWith([unwritten], asked.json);
};

const main = async (): Promise<number> => {
  const asked = readArguments(process.argv.slice(2));
  if ('wrong' in asked)
    return refuseWith([problem('unreadableWords', `${asked.wrong}. Write ${usage}.`)], false);
  return ask(asked);
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
