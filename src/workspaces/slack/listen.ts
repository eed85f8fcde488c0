import type { App } from '@slack/bolt';
import type { News } from '../news.ts';
import { answerCommand, type Commanding, commandName } from './command.ts';
import { heardIn } from './heard.ts';
import { inWords } from './log.ts';
import type { Self } from './lookup.ts';
import { answerOverheard } from './overheard.ts';
import type { Places } from './places/known.ts';
import { newsOf } from './places/newsOf.ts';
import { answerQuestion, type Questioning } from './question.ts';
import { type Feature, featureEvents } from './scopes.ts';
import { listenSurfaces, type Surfacing } from './surfaces/listenSurfaces.ts';

export type Listening = Questioning &
  Commanding &
  Surfacing & {
    readonly self: Self;
    readonly places: Places;
    readonly onNews: (news: News) => Promise<void>;
  };

/** What the platform tells of the workspace itself, for the features that live by it. */
const hearNews = (app: App, features: ReadonlySet<Feature>, { self, places, onNews }: Listening): void => {
  for (const feature of ['members', 'channelKind', 'pin'] as const)
    if (features.has(feature))
      for (const name of featureEvents[feature])
        app.event(name, async ({ event, body }) => {
          const news = newsOf(event, body.team_id, places, self.userId);
          if (news !== null) await onNews(news);
        });
};

/** Hands what arrives to whoever answers it, feature by feature. */
export const listen = (app: App, features: ReadonlySet<Feature>, listening: Listening): void => {
  const { log, self } = listening;

  const question = async (event: unknown, team: string, wanted: (direct: boolean) => boolean) => {
    const heard = heardIn(event, team, self);
    if (heard === null) await answerOverheard(listening, features, event, team);
    else if (wanted(heard.direct)) await answerQuestion(listening, heard);
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

  listenSurfaces(app, features, listening);

  hearNews(app, features, listening);

  app.error(async (error) => {
    log.error(`What arrived could not be dealt with: ${inWords(error)}`);
  });
};
