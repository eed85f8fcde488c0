import { existsSync, readFileSync } from 'node:fs';
import { Ajv } from 'ajv';
import formats from 'ajv-formats';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { z } from 'zod';
import { commandName } from '../../src/workspaces/slack/command.ts';
import { requestPath } from '../../src/workspaces/slack/receive.ts';
import { featureEvents, featureScopes } from '../../src/workspaces/slack/scopes.ts';
import { askShortcutId } from '../../src/workspaces/slack/surfaces/listenSurfaces.ts';
import { pinShortcutId } from '../../src/workspaces/slack/surfaces/pinShortcut.ts';

const text = readFileSync(new URL('../../config/workspace-app.yaml', import.meta.url), 'utf8');

const manifest = z.object({
  features: z.object({
    app_home: z.object({
      home_tab_enabled: z.boolean(),
      messages_tab_enabled: z.boolean(),
      messages_tab_read_only_enabled: z.boolean(),
    }),
    shortcuts: z.array(
      z.object({
        name: z.string().max(24),
        type: z.enum(['global', 'message']),
        callback_id: z.string().max(255),
        description: z.string().max(150),
      }),
    ),
    slash_commands: z.array(z.object({ command: z.string(), url: z.string().optional() })),
  }),
  oauth_config: z.object({ scopes: z.strictObject({ bot: z.array(z.string()) }) }),
  settings: z.object({
    event_subscriptions: z.object({ bot_events: z.array(z.string()), request_url: z.string().optional() }),
    interactivity: z.object({
      is_enabled: z.boolean(),
      request_url: z.string().optional(),
      message_menu_options_url: z.string().optional(),
    }),
    socket_mode_enabled: z.boolean(),
  }),
});

const app = manifest.parse(parse(text));
const distinct = (lists: Readonly<Record<string, readonly string[]>>) =>
  [...new Set(Object.values(lists).flat())].sort();

/** The lines that HTTP mode needs, with their comment marks off. */
const overHttp = parse(text.replaceAll(/^(\s*)# (\w+: https:)/gm, '$1$2'));

describe('the app manifest', () => {
  it('asks for exactly the scopes that some feature needs', () => {
    expect([...app.oauth_config.scopes.bot].sort()).toEqual(distinct(featureScopes));
  });

  it('subscribes to exactly the events that some feature hears of', () => {
    expect([...app.settings.event_subscriptions.bot_events].sort()).toEqual(distinct(featureEvents));
  });

  it('has the form and the shortcut that pins, under the names by which they are heard', () => {
    expect(app.features.shortcuts.map(({ type, callback_id }) => [type, callback_id])).toEqual([
      ['global', askShortcutId],
      ['message', pinShortcutId],
    ]);
  });

  it('lets people write to the bot, press its buttons, open its home and type its command', () => {
    expect(app.features.app_home).toEqual({
      home_tab_enabled: true,
      messages_tab_enabled: true,
      messages_tab_read_only_enabled: false,
    });
    expect(app.settings.interactivity.is_enabled).toBe(true);
    expect(app.features.slash_commands.map(({ command }) => command)).toEqual([commandName]);
  });

  it('stands for sockets as it is, and has an address for each kind of request once its marks are off', () => {
    expect(app.settings.socket_mode_enabled).toBe(true);
    expect(text.match(/https:/g)).toHaveLength(4);
    const { features, settings } = manifest.parse(overHttp);
    const addresses = [
      features.slash_commands[0]?.url,
      settings.event_subscriptions.request_url,
      settings.interactivity.request_url,
      settings.interactivity.message_menu_options_url,
    ];
    for (const address of addresses) expect(new URL(address ?? '').pathname).toBe(requestPath);
  });

  // The platform's own schema is published but not ours to carry: it is checked where it lies beside the project.
  const schemaFile = new URL('../../../shared/slack/manifest.schema.2.0.0.json', import.meta.url);
  if (existsSync(schemaFile)) {
    const ajv = new Ajv({ strict: false, allErrors: true });
    formats.default(ajv);
    const validate = ajv.compile(JSON.parse(readFileSync(schemaFile, 'utf8')));

    it.each([
      ['as it stands', parse(text)],
      ['over HTTP', overHttp],
    ])('is what the platform takes, %s', (_, document) => {
      validate(document);
      expect(validate.errors).toBeNull();
    });

    it('would not be with a word of its own in it', () => {
      expect(validate({ ...parse(text), colour: 'blue' })).toBe(false);
    });
  }
});
