import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { readSettings, type SettingsReading } from '../config/read.ts';
import { withRecordsUrl } from '../config/recordsUrl.ts';
import type { Settings } from '../config/schema.ts';
import type { Result } from '../terms/result.ts';
import { succeed } from '../terms/result.ts';
import type { Arguments } from './arguments.ts';

const inProject = (path: string): string => fileURLToPath(new URL(`../../config/${path}`, import.meta.url));

/** The desk’s own settings where it has written them, else the example, which names the demonstration prices. */
export const settingsPath = (asked: string | null): string => {
  if (asked !== null) return resolve(asked);
  const own = inProject('settings.yaml');
  return existsSync(own) ? own : inProject('example-settings.yaml');
};

/** A file named on the command line goes before the database that the environment names. */
const withRecordsPlace = (settings: Settings, file: string | null): Result<Settings> =>
  file === null
    ? withRecordsUrl(settings, process.env)
    : succeed({ ...settings, records: { ...settings.records, path: resolve(file), url: null } });

/** The settings that a command runs with: the file, then what the command line overrides. */
export const settingsFor = ({ config, feed, records, workspace }: Arguments): SettingsReading => {
  const reading = readSettings(settingsPath(config));
  if (!reading.ok) return reading;
  const placed = withRecordsPlace(reading.settings, records);
  if (!placed.ok) return { ok: false, problems: [{ ...placed.problem, path: 'records.url', value: null }] };
  const settings = {
    ...placed.value,
    ...(feed === null ? {} : { feed: { ...placed.value.feed, path: resolve(feed) } }),
  };
  if (workspace === 'slack' || workspace === 'terminal' || workspace === 'auto')
    return { ok: true, settings: { ...settings, workspace } };
  return { ok: true, settings };
};
