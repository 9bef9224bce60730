import { describe, expect, it } from 'vitest';
import { apertureAreaM2 } from '../../src/optics/dish.js';
import { squareFluxDistribution } from '../../src/optics/flux-map.js';
import { roundIntercept, squareIntercept } from '../../src/optics/intercept.js';
import { FIFTEEN_FOOT_DISH, SQUARE_INTERCEPTS } from './cases.js';
import { dish } from './example-dish.js';
import { traceRays } from './ray-trace.js';
import { OPTICS_TOLERANCES } from './tolerances.js';

const { apertureDiameterM, focalM, squareSideM } = FIFTEEN_FOOT_DISH;
const RAYS = 200_000;
const SEED = 20_260_117;

/** Standard errors between a count of hits and the share it should be. */
const sigmasOff = (hits: number, share: number): number =>
  (hits / RAYS - share) / Math.sqrt((share * (1 - share)) / RAYS);

describe('seeded ray trace in space', () => {
  it.each(SQUARE_INTERCEPTS.filter(({ intercept }) => intercept < 1))(
    'confirms the intercept on square and disc within its own error, slope $slopeErrorRad',
    ({ slopeErrorRad }) => {
      const traced = dish(apertureDiameterM, focalM / apertureDiameterM, slopeErrorRad);
      const halfM = squareSideM / 2;
      let onSquare = 0;
      let onDisc = 0;
      traceRays(traced, RAYS, SEED, (x, y) => {
        if (Math.abs(x) <= halfM && Math.abs(y) <= halfM) onSquare++;
        if (Math.hypot(x, y) <= halfM) onDisc++;
      });
      expect(Math.abs(sigmasOff(onSquare, squareIntercept(traced, squareSideM)))).toBeLessThan(
        OPTICS_TOLERANCES.monteCarloSigmas,
      );
      expect(Math.abs(sigmasOff(onDisc, roundIntercept(traced, halfM)))).toBeLessThan(
        OPTICS_TOLERANCES.monteCarloSigmas,
      );
    },
  );

  it('confirms the light on each cell of a square array', () => {
    const traced = dish(5, 0.6, 0.008);
    const sideM = 0.28;
    const cells = 4;
    const hits = new Float64Array(cells ** 2);
    traceRays(traced, RAYS, SEED, (x, y) => {
      const column = Math.floor((x / sideM + 0.5) * cells);
      const row = Math.floor((y / sideM + 0.5) * cells);
      if (column >= 0 && column < cells && row >= 0 && row < cells) hits[row * cells + column]! += 1;
    });
    const { relativeFlux, meanSuns } = squareFluxDistribution(traced, sideM, cells);
    const shareOfMeanCell = (meanSuns * (sideM / cells) ** 2) / apertureAreaM2(traced);
    hits.forEach((count, i) => {
      expect(Math.abs(sigmasOff(count, shareOfMeanCell * relativeFlux[i]!))).toBeLessThan(
        OPTICS_TOLERANCES.monteCarloSigmas,
      );
    });
  });
});
