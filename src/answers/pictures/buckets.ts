/** At most `most` runs of neighbours of nearly equal length, each made into one; all of them alone where they are fewer. */
export const thinned = <From, To>(
  all: readonly From[],
  most: number,
  merge: (some: readonly From[]) => To,
): readonly To[] => {
  const count = Math.min(most, all.length);
  return Array.from({ length: count }, (_, place) =>
    merge(
      all.slice(Math.floor((place * all.length) / count), Math.floor(((place + 1) * all.length) / count)),
    ),
  );
};
