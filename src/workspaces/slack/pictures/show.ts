import type { Content } from '../content.ts';
import type { Logger, ShownPicture, SpokenReply, Time } from '../ports.ts';
import type { Wire } from '../wire.ts';
import { makeUpload } from './upload.ts';

/** Makes the message that shows a picture, or says in words what it would show. */
export type ShowPicture = (picture: ShownPicture) => Promise<Content>;

const switchedOff =
  'Pictures are switched off here: the app lacks the permission files:write. Its owner can add it and install the app again.';
const notUploaded = 'The picture could not be uploaded. Ask for it again in a while.';

/** `on`: the token has what uploads need. */
export const makeShow = (on: boolean, wire: Wire, time: Time, log: Logger): ShowPicture => {
  const upload = makeUpload(wire, time, log);
  return async (picture) => {
    if (!on) return picture.inWords(switchedOff);
    const fileId = await upload(picture);
    return fileId === null ? picture.inWords(notUploaded) : picture.withFile(fileId);
  };
};

/** A message whose content may be made only when its turn comes. */
export type Turn = () => Promise<SpokenReply>;

/** Replies as messages in their order, each followed by its pictures. */
export const turnsOf = (replies: readonly SpokenReply[], show: ShowPicture): readonly Turn[] =>
  replies.flatMap((reply) => [
    async () => reply,
    ...(reply.pictures ?? []).map(
      (picture): Turn =>
        async () => ({ kind: reply.kind, private: reply.private, ...(await show(picture)) }),
    ),
  ]);
