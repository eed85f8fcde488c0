import { needed, Refused } from '../arguments.ts';
import type { Method, Methods } from '../desk.ts';
import { bot, team } from '../workspace.ts';

const authTest: Method = (desk) => ({
  url: `${desk.origin()}/`,
  team: team.domain,
  user: bot.name,
  team_id: team.id,
  user_id: bot.userId,
  bot_id: bot.botId,
  is_enterprise_install: false,
});

const usersInfo: Method = (desk, args) => {
  const person = desk.workspace.people.get(needed(args, 'user'));
  if (person === undefined) throw new Refused('user_not_found');
  return {
    user: {
      id: person.id,
      team_id: team.id,
      name: person.name,
      deleted: person.deleted,
      tz: person.zone,
      is_bot: false,
      is_restricted: person.guest !== 'no',
      is_ultra_restricted: person.guest === 'one channel',
    },
  };
};

export const workplace: Methods = { 'auth.test': authTest, 'users.info': usersInfo };
