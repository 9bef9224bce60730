import {
  extraterrestrialNormalWm2,
  meinelClearSkyBeamWm2,
  sunPosition,
  type SunPosition,
} from '@noonwell/engine';

export interface HourSite {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly altitudeM: number;
  readonly pressurePa: number;
}

/** Means over one hour [W/m²]. */
export interface HourIrradiance {
  dniWm2: number;
  ghiWm2: number;
  dhiWm2: number;
}

const SUBSTEPS = 6;
const HOUR_MS = 3_600_000;
const RAD_PER_DEG = Math.PI / 180;
const sun: SunPosition = { elevationRad: 0, azimuthRad: 0, trueElevationRad: 0 };

/**
 * Irradiance of one hour under a cover of cloud, as the mean of ten-minute steps: the clear-sky beam thinned
 * by the cover, diffuse light as a share of the extraterrestrial horizontal, and GHI = DHI + DNI cos z.
 * The shares are invented: 10 % of the extraterrestrial under a clear sky, 22 % overcast, most in between.
 *
 * @param startUtcMs start of the hour
 * @param cover 0 clear … 1 overcast
 * @param clearBeamFactor beam of a cloudless hour over the clear-sky relation's
 */
export function hourIrradiance(
  site: HourSite,
  startUtcMs: number,
  dayOfYear: number,
  dryBulbC: number,
  cover: number,
  clearBeamFactor: number,
  out: HourIrradiance,
): void {
  const beamShare = clearBeamFactor * Math.pow(1 - cover, 1.2);
  const diffuseShare = 0.1 * (1 - cover) + 0.45 * cover * (1 - cover) + 0.22 * cover;
  const extraterrestrial = extraterrestrialNormalWm2(dayOfYear);
  out.dniWm2 = 0;
  out.ghiWm2 = 0;
  out.dhiWm2 = 0;
  for (let step = 0; step < SUBSTEPS; step += 1) {
    const utcMs = startUtcMs + ((step + 0.5) / SUBSTEPS) * HOUR_MS;
    sunPosition(
      utcMs,
      site.latitudeDeg * RAD_PER_DEG,
      site.longitudeDeg * RAD_PER_DEG,
      site.pressurePa,
      dryBulbC,
      sun,
    );
    if (sun.elevationRad <= 0) continue;
    const cosZenith = Math.sin(sun.elevationRad);
    const dni = beamShare * meinelClearSkyBeamWm2(sun.elevationRad, site.altitudeM);
    const dhi = diffuseShare * extraterrestrial * cosZenith;
    out.dniWm2 += dni / SUBSTEPS;
    out.dhiWm2 += dhi / SUBSTEPS;
    out.ghiWm2 += (dhi + dni * cosZenith) / SUBSTEPS;
  }
}
