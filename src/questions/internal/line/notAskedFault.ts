import type { NotAskedTopic } from '../../help/topic.ts';
import type { Fault } from '../faults/fault.ts';
import { faultAt, type Line } from '../recognisers/recogniser.ts';
import { verbPlaces } from './verbPlaces.ts';

/** A word for something that the bot does not answer: what comes nearest, as a question where there is one. */
export const notAskedFault = (line: Line, at: number, topic: NotAskedTopic): Fault => {
  const hasVerb = verbPlaces(line).length > 0;
  const says = `is not answered. ${topic.nearest}`;
  const fault = faultAt(line, at, 1, {
    code: 'unreadableWords',
    says,
    instead: [hasVerb ? '' : topic.nearestVerb],
  });
  const help = [{ first: 0, wordCount: line.words.length, text: `help ${topic.name}` }];
  return { ...fault, repairs: [...fault.repairs, help] };
};
