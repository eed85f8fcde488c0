import { toBlocks } from '../../present/blocks.ts';
import { pictureMessage } from '../../present/pictureMessage.ts';
import { type Reply, reply } from '../../present/reply.ts';
import type { SpokenPicture } from '../../workspaces/conversation.ts';
import type { ShownPicture } from '../../workspaces/slack/ports.ts';

/** What a picture would show, where it cannot be shown: its own form in text, or its description. */
const inWords = ({ inText, altText }: SpokenPicture, why: string): Reply =>
  reply('answer', why, {
    passages: inText.length > 0 ? inText : [{ head: 'What it would show', lines: [altText] }],
  });

/** A picture as the Slack workspace wants it: with the messages that show it or say it in words. */
export const shownPicture = (picture: SpokenPicture): ShownPicture => ({
  ...picture,
  withFile: (fileId) => pictureMessage(picture, fileId),
  inWords: (why) => toBlocks(inWords(picture, why)),
});
