import { readerOf, refused, said } from '../conversation.ts';
import { act } from '../subscriptions/answerSubscriptions.ts';
import type { PressHandler } from './handler.ts';

/** Does to the digest or watch of the button what the same words would do. */
export const changing =
  (what: Parameters<typeof act>[3]): PressHandler =>
  async (desk, pressing) => {
    const changed = await act(desk, readerOf(pressing), pressing.answerId, what);
    return [changed.ok ? said(changed.value) : refused(changed)];
  };
