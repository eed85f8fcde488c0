import { z } from 'zod';
import { inWords } from '../log.ts';
import type { Logger, Time } from '../ports.ts';
import { callTimeoutMs } from '../settings.ts';
import { wait } from '../wait.ts';
import type { Outcome, Wire } from '../wire.ts';

/** A file as the platform wants it. */
export type UploadedFile = {
  readonly png: Uint8Array;
  readonly fileName: string;
  readonly title: string;
  readonly altText: string;
};

const mostAttempts = 3;
const pauseMs = 1_000;
/** The platform's page on uploads: what screen readers say of a file has this many characters at most. */
const longestFileAltText = 1_000;

const slot = z.object({ upload_url: z.string(), file_id: z.string() });

const send = async (url: string, png: Uint8Array): Promise<Outcome> => {
  try {
    const response = await fetch(url, {
      method: 'POST',
      headers: { 'content-type': 'application/octet-stream' },
      body: png,
      redirect: 'error',
      signal: AbortSignal.timeout(callTimeoutMs),
    });
    await response.arrayBuffer();
    return response.ok
      ? { kind: 'done', body: {}, warnings: [] }
      : { kind: 'unsure', reason: `status ${response.status}` };
  } catch (error) {
    return { kind: 'unsure', reason: inWords(error) };
  }
};

const reasonOf = (outcome: Exclude<Outcome, { kind: 'done' }>): string => {
  if (outcome.kind === 'refused') return outcome.code;
  return outcome.kind === 'limited' ? 'too many calls' : outcome.reason;
};

/**
 * Puts a file up where nobody sees it yet; its id, or null where that failed. Whatever is unclear is done anew from the
 * start: a file that is shown nowhere does no harm.
 */
export const makeUpload = (wire: Wire, time: Time, log: Logger) => {
  const once = async (file: UploadedFile): Promise<Outcome & { readonly fileId?: string }> => {
    const altText = file.altText.slice(0, longestFileAltText);
    // The platform's page calls it alt_txt and its own client alt_text; what is not known is not read.
    const opened = await wire.call('files.getUploadURLExternal', {
      filename: file.fileName,
      length: file.png.byteLength,
      alt_txt: altText,
      alt_text: altText,
    });
    if (opened.kind !== 'done') return opened;
    const read = slot.safeParse(opened.body);
    if (!read.success) return { kind: 'refused', code: 'no place to upload to', details: [] };
    const { upload_url, file_id: fileId } = read.data;
    const sent = await send(upload_url, file.png);
    if (sent.kind !== 'done') return sent;
    const completed = await wire.call('files.completeUploadExternal', {
      files: [{ id: fileId, title: file.title }],
    });
    return { ...completed, fileId };
  };

  return async (file: UploadedFile): Promise<string | null> => {
    let reason = '';
    for (let attempt = 0; attempt < mostAttempts; attempt += 1) {
      const outcome = await once(file);
      if (outcome.kind === 'done') return outcome.fileId ?? null;
      reason = reasonOf(outcome);
      if (outcome.kind === 'refused') break;
      await wait(time, outcome.kind === 'limited' ? outcome.retryAfterMs : pauseMs);
    }
    log.error(`A picture was not uploaded: ${reason}.`);
    return null;
  };
};
