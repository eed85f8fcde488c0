import type { HelpPage } from '../present/compose/help.ts';
import { generalTopic, topicNamed } from '../questions/help/topics.ts';

/** The page of a topic, or the first page where none is named so. */
export const helpPageOf =
  (builtVerbs: readonly string[]) =>
  (topic: string | null): HelpPage =>
    (topic === null ? null : topicNamed(topic)) ?? generalTopic(builtVerbs);
