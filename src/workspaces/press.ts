import type { Answers } from '../answers/answer.ts';
import { workingReplies } from '../present/answerReply.ts';
import { moreReplies } from '../present/compose/more.ts';
import type { ButtonAction, Reply } from '../present/reply.ts';
import { type Converse, type Pressing, refused, type Spoken, said } from './conversation.ts';
import type { Desk } from './desk.ts';
import { pinPressed } from './pins/answerPins.ts';
import { atAnotherLevel } from './pressed/atAnotherLevel.ts';
import { drawPressed } from './pressed/drawPressed.ts';
import type { PressHandler } from './pressed/handler.ts';
import { pressedAnswers } from './pressed/pressedAnswers.ts';
import { shareAnswers } from './pressed/share.ts';
import { changing } from './pressed/subscription.ts';

/** Shows something of the answers under the button. */
const showing =
  (show: (answers: Answers) => readonly Reply[]): PressHandler =>
  async (desk, pressing) => {
    const pressed = await pressedAnswers(desk, pressing);
    if (!pressed.ok) return [refused(pressed)];
    const { answers, changed } = pressed.value;
    return [...(changed === null ? [] : [changed]), ...show(answers)].map(said);
  };

/** A new button is one line here. */
const handlers: Readonly<Record<ButtonAction, PressHandler>> = {
  working: showing(workingReplies),
  more: showing(moreReplies),
  level: atAnotherLevel,
  share: shareAnswers,
  picture: drawPressed,
  pin: pinPressed,
  pauseSubscription: changing('pause'),
  resumeSubscription: changing('resume'),
  stopSubscription: changing('stop'),
};

/** Answers a press by what the button is for. */
export const answerPress = (
  desk: Desk,
  ask: Converse['ask'],
  pressing: Pressing,
): Promise<readonly Spoken[]> => handlers[pressing.action](desk, pressing, ask);
