import { needed, page, Refused } from '../arguments.ts';
import type { Method, Methods } from '../desk.ts';
import { bot, type Person, team } from '../workspace.ts';

const authTest: Method = (desk) => ({
  url: `${desk.origin()}/`,
  team: team.domain,
  user: bot.name,
  team_id: team.id,
  user_id: bot.userId,
  bot_id: bot.botId,
  is_enterprise_install: false,
});

/** A person as the platform describes them. */
export const described = (person: Person) => ({
  id: person.id,
  team_id: team.id,
  name: person.name,
  deleted: person.deleted,
  tz: person.zone,
  is_bot: false,
  is_restricted: person.guest !== 'no',
  is_ultra_restricted: person.guest === 'one channel',
});

const usersInfo: Method = (desk, args) => {
  const person = desk.workspace.people.get(needed(args, 'user'));
  if (person === undefined) throw new Refused('user_not_found');
  return { user: described(person) };
};

const usersList: Method = (desk, args) => {
  const { items, response_metadata } = page([...desk.workspace.people.values()], args, 1000);
  return { members: items.map(described), response_metadata };
};

export const workplace: Methods = {
  'auth.test': authTest,
  'users.info': usersInfo,
  'users.list': usersList,
};
