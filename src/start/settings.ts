import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { readSettings, type SettingsReading } from '../config/read.ts';
import type { Arguments } from './arguments.ts';

const inProject = (path: string): string => fileURLToPath(new URL(`../../config/${path}`, import.meta.url));

/** The desk’s own settings where it has written them, else the example, which names the demonstration prices. */
export const settingsPath = (asked: string | null): string => {
  if (asked !== null) return resolve(asked);
  const own = inProject('settings.yaml');
  return existsSync(own) ? own : inProject('example-settings.yaml');
};

/** The settings that a command runs with: the file, then what the command line overrides. */
export const settingsFor = ({ config, feed, records, workspace }: Arguments): SettingsReading => {
  const reading = readSettings(settingsPath(config));
  if (!reading.ok) return reading;
  const settings = {
    ...reading.settings,
    ...(feed === null ? {} : { feed: { ...reading.settings.feed, path: resolve(feed) } }),
    ...(records === null ? {} : { records: { ...reading.settings.records, path: resolve(records) } }),
  };
  if (workspace === 'slack' || workspace === 'terminal' || workspace === 'auto')
    return { ok: true, settings: { ...settings, workspace } };
  return { ok: true, settings };
};
