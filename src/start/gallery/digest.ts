import { scheduledReply } from '../../present/compose/scheduled/scheduledReply.ts';
import { type Converse, said } from '../../workspaces/conversation.ts';
import { terminalTeam } from '../../workspaces/subscriptions/managing.ts';
import type { DeskSubscriptions } from '../../workspaces/subscriptions/ports.ts';
import type { DigestPictures } from '../subscriptions/digestPictures.ts';
import type { Posted } from './writeGallery.ts';

const question = 'digest sessions 08:30 KELP TARN BRINE LIMPET SKERRY at 99%';

/** A digest as it would be posted now, with its picture; nothing where it cannot be made. */
export const digestOf = async (
  converse: Pick<Converse, 'ask'>,
  { store, digestNow }: DeskSubscriptions,
  draw: DigestPictures,
): Promise<readonly Posted[]> => {
  await converse.ask({ text: question, place: 'terminal' });
  const made = await store.list({ team: terminalTeam, kind: 'digest' });
  const [digest] = made.ok ? made.value : [];
  const post = digest === undefined ? null : await digestNow(digest);
  if (post?.ok !== true) return [];
  const picture = await draw(post.value);
  const spoken = { ...said(scheduledReply(post.value)), pictures: picture === null ? [] : [picture] };
  return [{ title: question, spoken }];
};
