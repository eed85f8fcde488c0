import { type Logger as BoltLogger, LogLevel } from '@slack/bolt';
import type { Logger } from './ports.ts';

/** Tokens, signing material and addresses that let their holder in or speak. */
const secretShapes = [
  /\bxox[a-z]-[\w-]+/g,
  /\bxapp-[\w-]+/g,
  /\bv0=[0-9a-f]{16,}/g,
  /\bBearer\s+\S+/gi,
  /([?&]ticket=)[^&\s"']+/g,
  /https?:\/\/hooks\.[^\s"']+/g,
];
const mask = '(not shown)';

const masked = (text: string, secrets: readonly string[]): string => {
  const named = secrets.reduce((shown, secret) => shown.replaceAll(secret, mask), text);
  return secretShapes.reduce((shown, shape) => shown.replace(shape, mask), named);
};

/** The same log, through which no secret passes. */
export const maskedLog = (log: Logger, secrets: readonly string[]): Logger => {
  const known = secrets.filter((secret) => secret !== '');
  return {
    info: (message) => log.info(masked(message, known)),
    warn: (message) => log.warn(masked(message, known)),
    error: (message) => log.error(masked(message, known)),
  };
};

/** An error in words: its name and message, never its parts, which can hold what was sent. */
export const inWords = (error: unknown): string =>
  error instanceof Error
    ? `${error.name}: ${error.message}`
    : typeof error === 'string'
      ? error
      : 'no reason given';

const line = (parts: readonly unknown[]): string => parts.map(inWords).join(' ');

/** For a client whose every outcome is looked at where it is used: what it would say itself is said there. */
export const silentLog: BoltLogger = {
  debug: () => {},
  info: () => {},
  warn: () => {},
  error: () => {},
  setLevel: () => {},
  getLevel: () => LogLevel.WARN,
  setName: () => {},
};

/** The log as the chat library wants it. What it would say for debugging holds people's words and is dropped. */
export const libraryLog = (log: Logger): BoltLogger => ({
  ...silentLog,
  info: (...parts) => log.info(line(parts)),
  warn: (...parts) => log.warn(line(parts)),
  error: (...parts) => log.error(line(parts)),
});
