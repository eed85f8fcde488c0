import { z } from 'zod';
import { settingsSchema } from './schema.ts';

/** One setting for the help page. `fallback` is the default as JSON, null where the setting must be given or may be absent. */
export type SettingHelp = {
  readonly path: string;
  readonly says: string;
  readonly expects: string;
  readonly fallback: string | null;
};

/** Stands for any ticker in the path of a setting. */
export const anyTicker = 'TICKER';

const nodeShape = z.object({
  description: z.string().optional(),
  expects: z.string().optional(),
  default: z.unknown().optional(),
  properties: z.record(z.string(), z.unknown()).optional(),
  additionalProperties: z.unknown().optional(),
});

const walk = (raw: unknown, path: string): SettingHelp[] => {
  const node = nodeShape.parse(raw);
  const below = (name: string): string => (path === '' ? name : `${path}.${name}`);
  const children = Object.entries(node.properties ?? {}).flatMap(([name, child]) => walk(child, below(name)));
  if (typeof node.additionalProperties === 'object') {
    children.push(...walk(node.additionalProperties, below(anyTicker)));
  }
  if (node.expects === undefined) return children;
  const fallback = node.default === undefined ? null : JSON.stringify(node.default);
  return [{ path, says: node.description ?? '', expects: node.expects, fallback }, ...children];
};

/** Every setting in the order of the schema. */
export const settingsHelp = (): readonly SettingHelp[] =>
  walk(z.toJSONSchema(settingsSchema, { io: 'input' }), '');

const written = (fallback: string): string => fallback.replace(/^"(.*)"$/, '$1');

/** The help page of all settings as plain text. */
export const settingsHelpPage = (): string =>
  settingsHelp()
    .map(({ path, says, expects, fallback }) => {
      const rest = fallback === null ? '' : ` Default: ${written(fallback)}.`;
      return `${path}\n    ${says}.\n    It must be ${expects}.${rest}\n`;
    })
    .join('\n');
