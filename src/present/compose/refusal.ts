import type { Problem } from '../../terms/problem.ts';
import { type Reply, reply } from '../reply.ts';

/** A refusal: what was wrong and what to do, and a question ready to send where one comes near. */
export const refusalReply = ({ message, suggestion }: Problem): Reply =>
  reply('refusal', message, {
    passages: suggestion === null ? [] : [{ head: null, lines: [`Try: ${suggestion}`] }],
  });
