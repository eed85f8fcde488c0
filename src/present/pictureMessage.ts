import { escapeFallback, type PlainText, plain } from './blocks.ts';
import { clipped } from './limits/cut.ts';
import { platformLimits as limits } from './limits/platformLimits.ts';

export type PictureBlock = {
  readonly type: 'image';
  readonly slack_file: { readonly id: string };
  readonly alt_text: string;
  readonly title: PlainText;
};

/** A message that shows an uploaded picture; what is to be seen stands in its text, for notifications and screen readers. */
export const pictureMessage = (
  { title, altText }: { readonly title: string; readonly altText: string },
  fileId: string,
): { readonly text: string; readonly blocks: readonly PictureBlock[] } => ({
  text: clipped(escapeFallback(altText), limits.message.textAdvised),
  blocks: [
    {
      type: 'image',
      slack_file: { id: fileId },
      alt_text: clipped(altText, limits.image.altText),
      title: plain(title, limits.image.title),
    },
  ],
});
