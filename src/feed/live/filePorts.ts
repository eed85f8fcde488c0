import { watch } from 'node:fs';
import { dirname } from 'node:path';
import type { Clock } from '../../terms/clock.ts';
import { openFiles } from '../openFeed.ts';
import { type FileState, listPriceFiles, stateOfFile } from '../priceFiles.ts';
import type { FeedSettings } from '../settings.ts';
import { openInThread } from '../thread/openInThread.ts';
import type { LiveFeedPorts } from './ports.ts';

/** The deepest folder of a path whose name holds no wildcard, so that a file that is replaced is noticed too. */
const folderToWatch = (path: string): string => {
  let folder = dirname(path);
  while (/[*?]/.test(folder)) folder = dirname(folder);
  return folder;
};

/** Notices of the file system where it gives any. Network drives give none; the regular look finds the change there. */
const watchFolder = (folder: string, call: () => void): { close: () => void } => {
  try {
    const watcher = watch(folder, { persistent: false }, call);
    watcher.on('error', () => watcher.close());
    return watcher;
  } catch {
    return { close: () => undefined };
  }
};

/** Files below this size are read sooner than a thread is made. */
const smallBytes = 2_000_000;

/** The ports of a live feed on the file system of this machine. `tell` is called once per piece of news. */
export const filePorts = (
  settings: FeedSettings,
  clock: Clock,
  tell: LiveFeedPorts['tell'],
): LiveFeedPorts => ({
  look: async () => {
    const { path } = settings.holidays;
    const holidays: FileState | null = path === null ? null : await stateOfFile(path);
    return { files: await listPriceFiles(settings.path), beside: holidays === null ? [] : [holidays] };
  },
  open: (files, nowMs) => {
    const bytes = files.reduce((sum, file) => sum + file.bytes, 0);
    return bytes < smallBytes ? openFiles(files, settings, nowMs) : openInThread(files, settings, nowMs);
  },
  nowMs: clock.nowMs,
  later: (delayMs, call) => {
    const timer = setTimeout(call, delayMs);
    timer.unref();
    return { cancel: () => clearTimeout(timer) };
  },
  watch: (call) => {
    const watchers = [watchFolder(folderToWatch(settings.path), call), watchFolder(settings.path, call)];
    return {
      close: () => {
        for (const watcher of watchers) watcher.close();
      },
    };
  },
  tell,
});
