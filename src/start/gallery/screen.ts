import { execFile } from 'node:child_process';
import { existsSync } from 'node:fs';
import { pathToFileURL } from 'node:url';
import { promisify } from 'node:util';

/** Where Debian's package puts the browser. */
const debiansBrowser = '/usr/bin/chromium';
const timeoutMs = 120_000;

/** A picture of the page as a browser shows it, where there is one; what was done, in words. */
export const screenOf = async (page: string, file: string, browser = debiansBrowser): Promise<string> => {
  if (!existsSync(browser)) return `No screen was taken: there is no browser at ${browser}.`;
  const size = ['--window-size=1280,20000', '--hide-scrollbars'];
  const safety = ['--headless', '--disable-gpu', '--no-sandbox'];
  const words = [...safety, ...size, `--screenshot=${file}`, pathToFileURL(page).href];
  try {
    await promisify(execFile)(browser, words, { timeout: timeoutMs });
    return `The page as a browser shows it: ${file}`;
  } catch (error) {
    return `No screen was taken: ${error instanceof Error ? error.message : String(error)}`;
  }
};
