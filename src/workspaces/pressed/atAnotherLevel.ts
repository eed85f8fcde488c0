import { refused } from '../conversation.ts';
import type { PressHandler } from './handler.ts';
import { pressedAnswers } from './pressedAnswers.ts';

/** Asks the question under the button again with what the button adds to it. The new answer is one like any other. */
export const atAnotherLevel: PressHandler = async (desk, pressing, ask) => {
  const pressed = await pressedAnswers(desk, pressing);
  if (!pressed.ok) return [refused(pressed)];
  const { place, from, added } = pressing;
  return ask({
    text: added ?? '',
    place,
    ...(from === undefined ? {} : { from }),
    after: pressed.value.question,
  });
};
