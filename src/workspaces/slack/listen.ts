import type { App } from '@slack/bolt';
import { answerCommand, type Commanding, commandName } from './command.ts';
import { heardIn } from './heard.ts';
import { inWords } from './log.ts';
import type { Self } from './lookup.ts';
import { answerPress, type Pressing } from './press.ts';
import { answerQuestion, type Questioning } from './question.ts';
import type { Feature } from './scopes.ts';

export type Listening = Questioning & Commanding & Pressing & { readonly self: Self };

/** Hands what arrives to whoever answers it, feature by feature. */
export const listen = (app: App, features: ReadonlySet<Feature>, listening: Listening): void => {
  const { log, self } = listening;

  const question = async (event: unknown, team: string, wanted: (direct: boolean) => boolean) => {
    const heard = heardIn(event, team, self);
    if (heard !== null && wanted(heard.direct)) await answerQuestion(listening, heard);
  };

  const answersIn = (direct: boolean): boolean => features.has(direct ? 'directMessage' : 'mention');

  app.event('app_mention', ({ event, body }) => question(event, body.team_id, answersIn));
  app.event('message', ({ event, body }) => question(event, body.team_id, answersIn));

  if (features.has('slashCommand')) {
    app.command(commandName, async ({ command, ack }) => {
      await ack();
      await answerCommand(listening, command);
    });
  }

  app.action(/[\s\S]*/, async ({ body, ack }) => {
    await ack();
    await answerPress(listening, body);
  });

  app.error(async (error) => {
    log.error(`What arrived could not be dealt with: ${inWords(error)}`);
  });
};
