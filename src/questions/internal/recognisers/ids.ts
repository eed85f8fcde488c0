import { readRecordId, readSubscriptionId } from '../../ids.ts';
import { found, type Recogniser } from './recogniser.ts';

/** The id of a recorded answer, a digest or a watch. */
export const id: Recogniser = (line, at) => {
  const text = line.words[at]?.text ?? '';
  const record = readRecordId(text);
  if (record !== null) return found({ kind: 'recordId', id: record }, 1);
  const subscription = readSubscriptionId(text);
  return subscription === null ? null : found({ kind: 'subscriptionId', id: subscription }, 1);
};
