import type { PinQuestion } from '../../questions/question.ts';
import { denied } from '../admission.ts';
import { type Asking, readerOf, type Spoken } from '../conversation.ts';
import type { Desk } from '../desk.ts';
import type { PressHandler } from '../pressed/handler.ts';
import { pinResult, unpinResult } from './pinning.ts';

/** Answers what is asked of pins. A card speaks for itself, so often nothing more is said. */
export const answerPins = (
  desk: Desk,
  { verb, id }: PinQuestion,
  asking: Asking,
): Promise<readonly Spoken[]> => (verb === 'pin' ? pinResult : unpinResult)(desk, readerOf(asking), id);

/** Pins the result under which the button stands, in the thread of that reply. */
export const pinPressed: PressHandler = async (desk, pressing) => {
  const asker = readerOf(pressing);
  const may = desk.permissions.mayAsk(asker, 'pin');
  if (!may.ok) return denied(may);
  const { from } = asker;
  // what is pinned from a message at the top of a conversation stands in the thread below it
  return pinResult(
    desk,
    { ...asker, from: { ...from, thread: from.thread ?? from.message } },
    pressing.answerId,
  );
};
