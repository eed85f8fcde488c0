import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Written while the bot runs, so that another process can tell that it does. */
export type Heartbeat = { readonly beatMs: number; readonly state: string };

const path = fileURLToPath(new URL('../../.leadsman/heartbeat.json', import.meta.url));
const beatEveryMs = 10_000;
const deadAfterMs = 35_000;

export const readHeartbeat = (from = path): Heartbeat | null => {
  try {
    const { beatMs, state } = JSON.parse(readFileSync(from, 'utf8')) as Partial<Heartbeat>;
    return typeof beatMs === 'number' && typeof state === 'string' ? { beatMs, state } : null;
  } catch {
    return null; // not there, or half of it: the same as no beat
  }
};

export const healthOf = (beat: Heartbeat | null, nowMs: number): { healthy: boolean; text: string } => {
  if (beat === null) return { healthy: false, text: 'no heartbeat' };
  const ageMs = nowMs - beat.beatMs;
  if (ageMs > deadAfterMs)
    return { healthy: false, text: `last heartbeat ${Math.round(ageMs / 1000)} s ago` };
  return { healthy: true, text: beat.state };
};

const beat = (state: string, nowMs: number, to: string): void => {
  mkdirSync(dirname(to), { recursive: true });
  writeFileSync(`${to}.new`, JSON.stringify({ beatMs: nowMs, state }));
  renameSync(`${to}.new`, to);
};

/** Beats until the returned function is called. A disk that cannot be written is said once and stops nothing. */
export const startHeartbeat = (
  state: () => string,
  warn: (message: string) => void,
  to = path,
): (() => void) => {
  let warned = false;
  const once = () => {
    try {
      beat(state(), Date.now(), to);
    } catch (error) {
      if (!warned) warn(`the heartbeat file ${to} cannot be written: ${String(error)}`);
      warned = true;
    }
  };
  once();
  const timer = setInterval(once, beatEveryMs);
  timer.unref();
  return () => clearInterval(timer);
};
