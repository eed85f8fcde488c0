import type { RandomStreams } from '../../../../terms/random.ts';
import type { TailFigureName, TailNote } from '../../tailFigures.ts';
import type { FilterSource, FilterState } from './filterSource.ts';

/** Resamples that fail are replaced; when as many failed as were wanted there is no interval. */
const mostTriesPerReplicate = 2;

/** How many states `visit` has seen, and how many resamples could not be refitted. */
export type Resampled = { readonly complete: boolean; readonly leftOut: number };

/**
 * Calls `visit` with the state of each resample that could be refitted, until `wanted` of them were seen. Try number t
 * uses stream t alone.
 */
export const visitResampledStates = (
  source: FilterSource,
  streams: RandomStreams,
  wanted: number,
  visit: (state: FilterState, replicate: number) => void,
): Resampled => {
  let seen = 0;
  let tries = 0;
  while (seen < wanted && tries < mostTriesPerReplicate * wanted) {
    const state = source.resample(streams.stream(tries));
    tries += 1;
    if (state === null) continue;
    visit(state, seen);
    seen += 1;
  }
  return { complete: seen === wanted, leftOut: tries - seen };
};

/** What a reader must know of resamples that were left out; nothing where there were none. */
export const leftOutNotes = (
  figure: TailFigureName,
  { complete, leftOut }: Resampled,
  wanted: number,
): readonly TailNote[] => {
  if (leftOut === 0) return [];
  const text = complete
    ? `${leftOut} of ${wanted + leftOut} resamples could not be refitted and were replaced by further ones.`
    : `${leftOut} of ${mostTriesPerReplicate * wanted} resamples could not be refitted, too many for an interval. Ask for a longer window.`;
  return [{ figure, code: 'resamplesLeftOut', text, needs: null }];
};
