/** Channels that were given a new id, and the id that each has now. */
export const idChanges = () => {
  const changes = new Map<string, string>();
  const keyOf = (team: string, channel: string): string => `${team} ${channel}`;
  return {
    note: (team: string, from: string, to: string): void => {
      changes.set(keyOf(team, from), to);
      // a channel that came back to an old id is there, whatever was noted before
      changes.delete(keyOf(team, to));
    },
    current: (team: string, channel: string): string => {
      let now = channel;
      for (let next = changes.get(keyOf(team, now)); next !== undefined; next = changes.get(keyOf(team, now)))
        now = next;
      return now;
    },
  };
};
