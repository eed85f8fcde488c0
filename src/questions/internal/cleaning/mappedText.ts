/** A text made from another one; `origins[i]` is where in the original its character i comes from. */
export type MappedText = { readonly text: string; readonly origins: readonly number[] };

export type MappedWriter = {
  /** Adds text whose characters stand one after the other from `origin` on. */
  readonly write: (text: string, origin: number) => void;
  readonly finish: () => MappedText;
};

export const createMappedWriter = (): MappedWriter => {
  const parts: string[] = [];
  const origins: number[] = [];
  return {
    write: (text, origin) => {
      parts.push(text);
      for (let index = 0; index < text.length; index += 1) origins.push(origin + index);
    },
    finish: () => ({ text: parts.join(''), origins }),
  };
};
