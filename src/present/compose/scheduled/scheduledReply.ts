import type { ScheduledPost } from '../../../terms/scheduledPosts.ts';
import type { Reply } from '../../reply.ts';
import { digestDetailReply, digestReply, freshReply } from './digest.ts';
import { ownerNoteReply } from './ownerNote.ts';
import { watchReply } from './watch.ts';

/** What is posted without being asked, as a reply that every workspace can lay out. */
export const scheduledReply = (post: ScheduledPost): Reply => {
  switch (post.kind) {
    case 'digest':
      return digestReply(post);
    case 'detail':
      return digestDetailReply(post);
    case 'fresh':
      return freshReply(post);
    case 'watch':
      return watchReply(post);
    case 'note':
      return ownerNoteReply(post);
  }
};
