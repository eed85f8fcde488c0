import { describe, expect, it } from 'vitest';
import { quantileMultiplier, shortfallMultiplier } from '../../../../src/stats/losses/studentMultiplier.ts';
import {
  esCoordinates,
  type TailCoordinates,
  varCoordinates,
} from '../../../../src/stats/tails/internal/tailCoordinates.ts';

const place = (coordinates: TailCoordinates, at: readonly number[]) => {
  const parameters = new Float64Array(3);
  const first = new Float64Array(6);
  const second = new Float64Array(9);
  const exists = coordinates.place(Float64Array.from(at), parameters, first, second);
  return { parameters, first, second, exists };
};

const step = 1e-5;
const moved = (at: readonly number[], which: number, by: number) =>
  at.map((value, index) => (index === which ? value + by : value));

const cases = [
  { name: 'VaR at 99%', coordinates: varCoordinates(0.01, 2.5), at: [0.1, 0.3] },
  { name: 'VaR at 60%, held by the location', coordinates: varCoordinates(0.4, 0.2), at: [-0.2, 0.3] },
  { name: 'ES at 97.5%', coordinates: esCoordinates(0.025, 3), at: [0.1, 0.4] },
] as const;

describe('Coordinates along which a tail figure stays what it is', () => {
  it('keep VaR and ES', () => {
    for (const [coordinates, multiplier, figure] of [
      [varCoordinates(0.01, 2.5), (nu: number) => quantileMultiplier(0.01, nu), 2.5],
      [varCoordinates(0.4, 0.2), (nu: number) => quantileMultiplier(0.4, nu), 0.2],
      [esCoordinates(0.01, 3), (nu: number) => shortfallMultiplier(0.01, nu), 3],
    ] as const)
      for (const at of [
        [0.1, 0.3],
        [-0.3, 0],
        [0.2, 0.9],
      ]) {
        const { parameters } = place(coordinates, at);
        const [location = Number.NaN, logScale = Number.NaN, inverseNu = Number.NaN] = parameters;
        // one rounding of the logarithm and the exponential of the scale
        expect(Math.exp(logScale) * multiplier(1 / inverseNu) - location).toBeCloseTo(figure, 12);
      }
  });

  for (const { name, coordinates, at } of cases)
    it(`have the derivatives of their differences: ${name}`, () => {
      const { first, second } = place(coordinates, at);
      for (const which of [0, 1]) {
        const below = place(coordinates, moved(at, which, -step));
        const above = place(coordinates, moved(at, which, step));
        for (let parameter = 0; parameter < 3; parameter += 1) {
          const slope =
            ((above.parameters[parameter] as number) - (below.parameters[parameter] as number)) / (2 * step);
          // differences of differences: 1e-8 of the multiplier's own slope, and step²
          expect(Math.abs((first[2 * parameter + which] as number) - slope)).toBeLessThan(1e-6);
          for (const other of [0, 1]) {
            const place2 = 2 * parameter + other;
            const bend = ((above.first[place2] as number) - (below.first[place2] as number)) / (2 * step);
            expect(Math.abs((second[3 * parameter + which + other] as number) - bend)).toBeLessThan(1e-4);
          }
        }
      }
    });

  it('start from the nearest distribution, and know where there is none', () => {
    const somewhere = { location: 0.1, logScale: -0.4, inverseNu: 0.3 };
    expect([...varCoordinates(0.01, 2.5).of(somewhere)]).toEqual([0.1, 0.3]);
    expect([...varCoordinates(0.4, 0.2).of(somewhere)]).toEqual([-0.4, 0.3]);
    expect(esCoordinates(0.01, 3).of(somewhere)[1]).toBeCloseTo(-Math.log(0.7), 14);
    expect(esCoordinates(0.01, 3).of({ ...somewhere, inverseNu: 1.5 })[1]).toBeCloseTo(Math.log(1e6), 8);
    expect(place(varCoordinates(0.01, 1), [-1.5, 0.3]).exists).toBe(false);
    expect(place(esCoordinates(0.01, 1), [-1.5, 0.3]).exists).toBe(false);
  });
});
