import { describe, expect, it } from 'vitest';
import { beamShareNeeded } from '../../src/optics/claim.js';
import { apertureAreaM2, geometricConcentration, rimAngleRad } from '../../src/optics/dish.js';
import { roundIntercept, squareIntercept } from '../../src/optics/intercept.js';
import { idealConcentration, idealFlatTargetConcentration } from '../../src/optics/limits.js';
import { radians } from '../angles.js';
import {
  CONCENTRATION_LIMITS,
  FIFTEEN_FOOT_DISH,
  GEOMETRIC_CONCENTRATION,
  POWER_CLAIM,
  RIM_ANGLES,
  SQUARE_INTERCEPTS,
} from './cases.js';
import { dish } from './example-dish.js';
import { OPTICS_TOLERANCES } from './tolerances.js';

const { apertureDiameterM, focalM, squareSideM } = FIFTEEN_FOOT_DISH;
const relativeError = (computed: number, published: number): number => Math.abs(computed / published - 1);

describe('optics against published and analytic values', () => {
  it('ideal limits', () => {
    expect(relativeError(idealConcentration(), CONCENTRATION_LIMITS.any)).toBeLessThan(
      OPTICS_TOLERANCES.concentrationRelative,
    );
    for (const { rimDeg, concentration } of CONCENTRATION_LIMITS.flatTarget) {
      const computed = idealFlatTargetConcentration(radians(rimDeg));
      expect(relativeError(computed, concentration)).toBeLessThan(OPTICS_TOLERANCES.concentrationRelative);
    }
  });

  it.each(RIM_ANGLES)('rim $rimDeg° at f/D $focalRatio', ({ rimDeg, focalRatio }) => {
    const focalRatioComputed = 1 / (4 * Math.tan(radians(rimDeg) / 2));
    expect(Math.abs(focalRatioComputed - focalRatio)).toBeLessThan(OPTICS_TOLERANCES.focalRatio);
    expect(rimAngleRad({ focalRatio: focalRatioComputed })).toBeCloseTo(radians(rimDeg), 12);
  });

  it.each([0.5, 1, 2])('intercept of a round face tends to the closed form, radius %d σf', (sigmas) => {
    // f/D 5: rim 5.7°. All errors but the slope's are equal along and across, so σ is one number.
    const flat = dish(2, 5, 0.004);
    const sigmaRad = Math.sqrt(0.00273 ** 2 + 0.008 ** 2 + 0.001 ** 2 + 0.002 ** 2);
    // The closed form leaves out the growth of the image with the ring angle: of first order in the mean square.
    const radiusM = sigmas * sigmaRad * 10;
    const computed = roundIntercept(flat, radiusM);
    const closedForm = 1 - Math.exp((-radiusM * radiusM) / (2 * (10 * sigmaRad) ** 2));
    expect(Math.abs(computed - closedForm)).toBeLessThan(OPTICS_TOLERANCES.smallRimIntercept * 3);
    const flatter = dish(2, 10, 0.004);
    const closer = Math.abs(roundIntercept(flatter, 2 * radiusM) - closedForm);
    expect(closer).toBeLessThan(OPTICS_TOLERANCES.smallRimIntercept);
    expect(closer).toBeLessThan(Math.abs(computed - closedForm) / 3);
  });

  it.each(SQUARE_INTERCEPTS)(
    'intercept $intercept at slope $slopeErrorRad',
    ({ slopeErrorRad, intercept }) => {
      const computed = squareIntercept(
        dish(apertureDiameterM, focalM / apertureDiameterM, slopeErrorRad),
        squareSideM,
      );
      expect(Math.abs(computed - intercept)).toBeLessThan(OPTICS_TOLERANCES.tracedIntercept);
    },
  );

  it('geometric concentration of a 15 ft dish on a 10 in square', () => {
    const computed = geometricConcentration({ apertureDiameterM }, squareSideM ** 2);
    expect(relativeError(computed, GEOMETRIC_CONCENTRATION)).toBeLessThan(
      OPTICS_TOLERANCES.concentrationRelative,
    );
  });

  it('share of the beam a 4.5 kW rating needs', () => {
    const share = beamShareNeeded(
      POWER_CLAIM.statedPowerW,
      POWER_CLAIM.dniWm2,
      apertureAreaM2({ apertureDiameterM }),
    );
    expect(relativeError(share, POWER_CLAIM.beamShare)).toBeLessThan(OPTICS_TOLERANCES.claimShareRelative);
  });
});
