import { pino } from 'pino';

/** The operator’s log: one JSON object a line, on standard error, so that standard output stays the terminal’s own. */
export const operatorLog = () => {
  const log = pino({ base: null }, pino.destination({ dest: 2, sync: true }));
  return {
    info: (message: string) => log.info(message),
    warn: (message: string) => log.warn(message),
    error: (message: string) => log.error(message),
  };
};

/** In the terminal the person who asks is the operator, and what is wrong is said in the replies. */
export const silentLog = { info: () => {}, warn: () => {}, error: () => {} } as const;
