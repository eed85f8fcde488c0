import { describe, expect, it } from 'vitest';
import { findProfileEnd, type ProfileAt } from '../../../../src/stats/tails/internal/profileEnd.ts';

const search = (profile: ProfileAt, more: Partial<Parameters<typeof findProfileEnd>[0]> = {}) =>
  findProfileEnd({
    profile,
    estimate: 0,
    highest: 0,
    reach: 2,
    firstDistance: 1,
    direction: 1,
    bound: Number.POSITIVE_INFINITY,
    ...more,
  });

/** A parabola −x²/(2·scale²): falls by half of reach² at reach·scale. */
const parabola =
  (scale: number): ProfileAt =>
  (x) => ({ value: (-x * x) / (2 * scale * scale), slope: -x / (scale * scale) });

/** Counts how often a profile is asked. */
const counted = (profile: ProfileAt) => {
  const count = { calls: 0 };
  const asked: ProfileAt = (x) => {
    count.calls += 1;
    return profile(x);
  };
  return { count, asked };
};

describe('The end of a profile', () => {
  it('is found on a parabola in two looks, whichever way', () => {
    const { count, asked } = counted(parabola(3));
    expect(search(asked)).toEqual({ kind: 'end', figure: expect.closeTo(6, 9) });
    expect(count.calls).toBeLessThanOrEqual(3);
    expect(search(parabola(3), { direction: -1, bound: Number.NEGATIVE_INFINITY })).toEqual({
      kind: 'end',
      figure: expect.closeTo(-6, 9),
    });
  });

  it('is found from a guess that is far too long or far too short', () => {
    for (const firstDistance of [1e-9, 1e9])
      expect(search(parabola(1), { firstDistance })).toEqual({ kind: 'end', figure: expect.closeTo(2, 8) });
  });

  it('is found where the profile levels off just below the reach', () => {
    // −2.2·x/(1 + x): passes −2 at x = 10
    const profile: ProfileAt = (x) => ({ value: (-2.2 * x) / (1 + x), slope: -2.2 / (1 + x) ** 2 });
    expect(search(profile)).toEqual({ kind: 'end', figure: expect.closeTo(10, 6) });
  });

  it('is the bound where the profile is still high there, or starts on it', () => {
    expect(search(parabola(1), { bound: 1.5 })).toEqual({ kind: 'bound' });
    expect(search(parabola(1), { bound: 0 })).toEqual({ kind: 'bound' });
    expect(search(parabola(1), { bound: 2.5 })).toEqual({ kind: 'end', figure: expect.closeTo(2, 9) });
  });

  it('is not found where the profile never falls, after a fixed number of looks', () => {
    const { count, asked } = counted(() => ({ value: 0, slope: 0 }));
    expect(search(asked)).toEqual({ kind: 'notFound' });
    expect(count.calls).toBeLessThanOrEqual(80);
  });

  it('is not found beyond where the profile cannot be had, and is found before it', () => {
    const upTo =
      (edge: number): ProfileAt =>
      (x) =>
        x > edge ? null : parabola(1)(x);
    expect(search(upTo(1.5))).toEqual({ kind: 'notFound' });
    expect(search(upTo(2.5), { firstDistance: 40 })).toEqual({ kind: 'end', figure: expect.closeTo(2, 9) });
  });

  it('survives a slope that points the wrong way', () => {
    const lying: ProfileAt = (x) => ({ value: (-x * x) / 2, slope: x });
    expect(search(lying)).toEqual({ kind: 'end', figure: expect.closeTo(2, 8) });
  });
});
