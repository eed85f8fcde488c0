import type { DigestPicture } from '../../answers/pictures/pictureData.ts';
import { isoFromDay } from '../../terms/day.ts';
import type { PriceSeries, PriceSnapshot } from '../../terms/prices.ts';
import type { Result } from '../../terms/result.ts';
import type { DigestLine, DigestPost } from '../../terms/scheduledPosts.ts';
import type { SpokenPicture } from '../../workspaces/conversation.ts';
import type { Drawing } from '../../workspaces/pictures.ts';

/** The picture of a digest; null where there is none, which stops no digest. */
export type DigestPictures = (post: DigestPost) => Promise<SpokenPicture | null>;

export type DigestPicturesParts = {
  readonly drawing: Drawing;
  readonly snapshot: () => Result<PriceSnapshot>;
  readonly tell: (message: string) => void;
};

const sticksShown = 60;

/** The last simple returns up to the day that the line speaks of. */
const returnsOf = (line: DigestLine, series: PriceSeries | null): readonly number[] => {
  if (!line.ok || series === null) return [];
  const closes = [...series.closes].filter((_, row) => (series.days[row] as number) <= line.asOf);
  const last = closes.slice(-sticksShown - 1);
  return last.slice(1).map((close, place) => close / (last[place] as number) - 1);
};

const dataOf = (post: DigestPost, live: Result<PriceSnapshot>): DigestPicture | null => {
  const days = post.lines.flatMap((line) => (line.ok ? [line.asOf] : []));
  if (days.length === 0) return null;
  return {
    kind: 'digest',
    id: post.id,
    asOf: isoFromDay(Math.max(...days)),
    tailLevel: post.tailLevel,
    confidenceLevel: post.confidenceLevel,
    model: post.model,
    rows: post.lines.map((line) => ({
      line,
      returns: returnsOf(line, live.ok ? live.value.series(line.ticker) : null),
    })),
  };
};

/** Draws digests from their own lines and the prices that are live. */
export const createDigestPictures = ({ drawing, snapshot, tell }: DigestPicturesParts): DigestPictures => {
  const failed = (id: string, why: string): null => {
    tell(`The picture of ${id} was not drawn: ${why}`);
    return null;
  };
  return async (post) => {
    const data = dataOf(post, snapshot());
    if (data === null) return null;
    try {
      const drawn = await drawing.drawData(data);
      return drawn.ok ? { ...drawn.value, inText: [] } : failed(post.id, drawn.problem.message);
    } catch (error) {
      return failed(post.id, error instanceof Error ? error.message : String(error));
    }
  };
};
