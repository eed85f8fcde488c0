import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import type { Settings } from './schema.ts';
import { type Secret, secret } from './secret.ts';

export type WorkspaceToStart =
  | { readonly kind: 'terminal' }
  | {
      readonly kind: 'slack';
      readonly connection: 'socket';
      readonly botToken: Secret;
      readonly appToken: Secret;
      readonly apiUrl: string | null;
    }
  | {
      readonly kind: 'slack';
      readonly connection: 'http';
      readonly port: number;
      readonly botToken: Secret;
      readonly signingSecret: Secret;
      readonly apiUrl: string | null;
    };

type Environment = Readonly<Record<string, string | undefined>>;

const tokenNames = ['SLACK_BOT_TOKEN', 'SLACK_APP_TOKEN', 'SLACK_SIGNING_SECRET'] as const;
type TokenName = (typeof tokenNames)[number];

const present = (env: Environment, name: string): string | null => {
  const value = env[name]?.trim() ?? '';
  return value === '' ? null : value;
};

const missing = (names: readonly TokenName[], connection: string) =>
  refuse(
    problem(
      'tokenMissing',
      `Slack over ${connection} needs ${names.join(' and ')}, which ${names.length === 1 ? 'is' : 'are'} not set in the environment. ` +
        `Set ${names.length === 1 ? 'it' : 'them'}, or set workspace to terminal to ask in the terminal.`,
    ),
  );

/**
 * Which workspace to start. Tokens come from the environment alone. `auto` without any token is the terminal; with some
 * of the needed tokens but not all it is a problem, never a silent fall back to the terminal.
 */
export const readTokens = (
  env: Environment,
  settings: Pick<Settings, 'workspace' | 'slack'>,
): Result<WorkspaceToStart> => {
  const { workspace: kind } = settings;
  const { connection, port } = settings.slack;
  const noneSet = tokenNames.every((name) => present(env, name) === null);
  if (kind === 'terminal' || (kind === 'auto' && noneSet)) return succeed({ kind: 'terminal' });
  const second: TokenName = connection === 'socket' ? 'SLACK_APP_TOKEN' : 'SLACK_SIGNING_SECRET';
  const botToken = present(env, 'SLACK_BOT_TOKEN');
  const secondToken = present(env, second);
  if (botToken === null || secondToken === null) {
    const names: TokenName[] = [];
    if (botToken === null) names.push('SLACK_BOT_TOKEN');
    if (secondToken === null) names.push(second);
    return missing(names, connection);
  }
  const slack = { kind: 'slack', botToken: secret(botToken), apiUrl: present(env, 'SLACK_API_URL') } as const;
  return succeed(
    connection === 'socket'
      ? { ...slack, connection, appToken: secret(secondToken) }
      : { ...slack, connection, port, signingSecret: secret(secondToken) },
  );
};
