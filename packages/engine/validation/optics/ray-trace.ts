import { type DishSettings, focalLengthM } from '../../src/optics/dish.js';
import { normalStream, uniformStream } from '../random.js';

type Vector = readonly [number, number, number];
const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const cross = (a: Vector, b: Vector): Vector => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
const unit = (a: Vector): Vector => {
  const length = Math.hypot(...a);
  return [a[0] / length, a[1] / length, a[2] / length];
};

/** Turns a unit vector by small angles about two axes across it, each normal with the given deviation. */
function scatter(direction: Vector, sigmaRad: number, normal: () => number): Vector {
  const across = unit(cross(direction, Math.abs(direction[0]) < 0.5 ? [1, 0, 0] : [0, 1, 0]));
  const other = cross(direction, across);
  const a = sigmaRad * normal();
  const b = sigmaRad * normal();
  return unit([
    direction[0] + a * across[0] + b * other[0],
    direction[1] + a * across[1] + b * other[1],
    direction[2] + a * across[2] + b * other[2],
  ]);
}

const reflect = (ray: Vector, normalVector: Vector): Vector => {
  const twice = 2 * dot(ray, normalVector);
  return [
    ray[0] - twice * normalVector[0],
    ray[1] - twice * normalVector[1],
    ray[2] - twice * normalVector[2],
  ];
};

/**
 * Where seeded random rays meet the focal plane of a paraboloid z = r²/4f: a full reflection in space with
 * each error drawn ray by ray. It shares no relation with the ring images it is used to confirm.
 *
 * @param each - receives every ray's point in the focal plane [m]
 */
export function traceRays(
  dish: DishSettings,
  count: number,
  seed: number,
  each: (xM: number, yM: number) => void,
): void {
  const uniform = uniformStream(seed);
  const normal = normalStream(uniform);
  const focalM = focalLengthM(dish);
  const sunAndTrackingRad = Math.hypot(dish.sunWidthRad, dish.trackingErrorRad);
  for (let i = 0; i < count; i++) {
    const radiusM = (dish.apertureDiameterM / 2) * Math.sqrt(uniform());
    const turn = 2 * Math.PI * uniform();
    const point: Vector = [
      radiusM * Math.cos(turn),
      radiusM * Math.sin(turn),
      (radiusM * radiusM) / (4 * focalM),
    ];
    const sunRay = scatter([0, 0, -1], sunAndTrackingRad, normal);
    const trueNormal = unit([-point[0] / (2 * focalM), -point[1] / (2 * focalM), 1]);
    const mirrored = reflect(sunRay, scatter(trueNormal, dish.slopeErrorRad, normal));
    const ray = scatter(mirrored, dish.specularErrorRad, normal);
    const lengthM = (focalM - point[2]) / ray[2];
    each(point[0] + lengthM * ray[0], point[1] + lengthM * ray[1]);
  }
}
