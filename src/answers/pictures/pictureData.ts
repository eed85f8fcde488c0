import type { Answers } from '../answer.ts';

/** What a picture is drawn from: the answers, and beside them what the picture shows that they do not hold. Plain data. */
export type PictureData = { readonly kind: 'figures'; readonly answers: Answers };
