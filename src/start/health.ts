import { healthOf, readHeartbeat } from './heartbeat.ts';

/** Exit 0 where the bot beats, 1 where it has stopped: for the image’s health check. */
const found = healthOf(readHeartbeat(), Date.now());
process.stdout.write(`${found.text}\n`);
process.exitCode = found.healthy ? 0 : 1;
