import { count, needed, Refused, words } from '../arguments.ts';
import { type Desk, type Method, type Methods, openChannel, type StoredFile } from '../desk.ts';
import { bot } from '../workspace.ts';

/** What screen readers say of a file, by the platform's page on uploads. */
const longestAltText = 1_000;

const getUploadUrl: Method = (desk, args) => {
  const id = desk.newId('F');
  const length = count(args, 'length', 0);
  const altText = words(args, 'alt_text') ?? words(args, 'alt_txt');
  if (length <= 0 || (altText ?? '').length > longestAltText) throw new Refused('invalid_arguments');
  desk.files.set(id, {
    id,
    name: needed(args, 'filename'),
    length,
    altText,
    bytes: null,
    completed: false,
    refusalsLeft: 0,
  });
  return { upload_url: `${desk.origin()}/upload/${id}`, file_id: id };
};

const namedFiles = (desk: Desk, given: unknown): StoredFile[] => {
  if (!Array.isArray(given) || given.length === 0) throw new Refused('invalid_arguments');
  return given.map((entry: unknown) => {
    const id = typeof entry === 'object' && entry !== null && 'id' in entry ? String(entry.id) : '';
    const file = desk.files.get(id);
    // A file that comes as a form is larger than the file.
    if (file === undefined || file.completed || (file.bytes?.length ?? 0) < file.length)
      throw new Refused('file_not_found');
    return file;
  });
};

const completeUpload: Method = (desk, args) => {
  const files = namedFiles(desk, args['files']);
  const channelId = words(args, 'channel_id');
  for (const file of files) file.completed = true;
  if (channelId !== null) {
    desk.workspace.say(openChannel(desk, channelId), {
      user: bot.userId,
      botId: bot.botId,
      subtype: 'file_share',
      threadTs: words(args, 'thread_ts'),
    });
  }
  return { files: files.map(({ id, name }) => ({ id, title: name })) };
};

export const files: Methods = {
  'files.getUploadURLExternal': getUploadUrl,
  'files.completeUploadExternal': completeUpload,
};
