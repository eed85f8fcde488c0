/** Under which keys what answers an event is said, each once. */
export const replyKey = (eventKey: string, place: number): string => `reply:${eventKey}:${place}`;

export const placeholderKey = (eventKey: string): string => `placeholder:${eventKey}`;

export const lateKey = (eventKey: string): string => `late:${eventKey}`;

/** No answer is longer than this many replies. */
export const mostReplies = 20;
