import { reply } from '../../present/reply.ts';
import { refused, said } from '../conversation.ts';
import { pictured } from '../pictured.ts';
import type { PressHandler } from './handler.ts';
import { pressedAnswers } from './pressedAnswers.ts';

/** The picture of the answers under the button, in a message of its own. */
export const drawPressed: PressHandler = async (desk, pressing) => {
  const pressed = await pressedAnswers(desk, pressing);
  if (!pressed.ok) return [refused(pressed)];
  const { answers, job, changed } = pressed.value;
  const drawn = await desk.drawing.draw(job, answers);
  if (!drawn.ok) return [refused(drawn)];
  const [{ id, question }] = answers;
  const given = said(reply('working', `The picture of ${id}: ${question}.`));
  return [...(changed === null ? [] : [said(changed)]), pictured(given, drawn)];
};
