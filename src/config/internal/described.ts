import type { z } from 'zod';

type Described<Kind extends z.ZodType> = {
  readonly kind: Kind;
  readonly says: string;
  /** What would be right, to follow the words "it must be". */
  readonly expects: string;
};

/** The kind of a setting with its help attached, so that the schema is the one place that speaks of it. */
export const described = <Kind extends z.ZodType>({ kind, says, expects }: Described<Kind>): Kind =>
  kind.meta({ description: says, expects });
