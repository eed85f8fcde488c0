import { answersReply } from '../../present/answerReply.ts';
import { denied } from '../admission.ts';
import { readerOf, refused, said } from '../conversation.ts';
import type { PressHandler } from './handler.ts';
import { pressedAnswers } from './pressedAnswers.ts';

/** The answers under the button as everybody in the channel may see them, where the question may be asked there. */
export const shareAnswers: PressHandler = async (desk, pressing) => {
  const pressed = await pressedAnswers(desk, pressing);
  if (!pressed.ok) return [refused(pressed)];
  const { answers, changed } = pressed.value;
  const may = desk.permissions.mayAsk({ ...readerOf(pressing), place: 'channel' }, answers[0].verb);
  if (!may.ok) return denied(may);
  return [...(changed === null ? [] : [changed]), answersReply(answers)].map(said);
};
