import { requireRange } from '../errors.js';
import type { HorizonProfile } from '../place/horizon.js';
import type { SunPosition } from '../sun/position.js';
import { azimuthFromEquatorRad } from './azimuth.js';
import { TRACKER_STATE_INDEX } from './states.js';

/** An azimuth-elevation mount and its rules. */
export interface TrackerSettings {
  /** Whole travel in azimuth, end to end [rad, > 0 to 2π]; 2π reaches every azimuth. */
  readonly azimuthSpanRad: number;
  /**
   * Middle of the azimuth travel, clockwise from the equator's direction [rad, −π to π]: 0 is south in the
   * northern hemisphere and on the equator, north in the southern.
   */
  readonly azimuthCentreOffsetRad: number;
  /** Lowest and highest elevation the mount can point at [rad, 0 to π/2]. */
  readonly elevationMinRad: number;
  readonly elevationMaxRad: number;
  /** The dish goes on the sun at this beam or more [W/m², ≥ 0]. */
  readonly startDniWm2: number;
  /** It is stowed at this mean wind or more [m/s, > 0]. */
  readonly stowWindMs: number;
  /** A stowed dish comes back only after the wind has stayed under this [m/s, > 0, at most the stow wind]. */
  readonly resumeWindMs: number;
  /** For so long [s, ≥ 0]. */
  readonly resumeAfterS: number;
}

/** A mount through time: it remembers whether it is stowed and how long the wind has been down. */
export interface Tracker {
  /**
   * The state of the sub-step that now begins.
   *
   * The first that holds: out of service, night park, below the horizon profile, wind stow, out of travel,
   * waiting, tracking. The wind is watched by night and in an outage too, so that a stormy dawn finds the dish
   * stowed. Call once a sub-step, in order of time.
   *
   * @param sun - position at the middle of the sub-step
   * @param dniWm2 - beam normal irradiance [W/m², ≥ 0]
   * @param windMs - mean wind speed [m/s, ≥ 0]
   * @param dtS - length of the sub-step [s, > 0]
   * @param inService - false in a scheduled outage
   * @returns index into `TRACKER_STATES`; never a defocus state
   * @throws DomainError for a wind, beam or length that is negative or not a number
   */
  decide(sun: Readonly<SunPosition>, dniWm2: number, windMs: number, dtS: number, inService: boolean): number;
}

/**
 * A mount at rest in calm air.
 *
 * The hold counts the whole sub-steps with a wind under the resume speed that have passed since the last one
 * at or over it: with 5-minute steps and a hold of 15 minutes three calm steps stay stowed and the fourth
 * tracks. A step of 2.5 minutes gives the same quarter of an hour.
 *
 * @param settings - travel and rules
 * @param latitudeRad - of the site, north positive [rad, −π/2 to π/2]: says which way the equator lies
 * @param horizon - what hides the sun around the dish
 * @returns the tracker
 * @throws DomainError naming the setting that is out of range
 *
 * Source: travel, thresholds and hold as stated in the settings; defaults are common practice, no source.
 */
export function createTracker(
  settings: TrackerSettings,
  latitudeRad: number,
  horizon: HorizonProfile,
): Tracker {
  requireTrackerSettings(settings);
  requireRange('latitude [rad]', latitudeRad, -Math.PI / 2, Math.PI / 2);
  return new AzimuthElevationTracker(settings, latitudeRad, horizon);
}

class AzimuthElevationTracker implements Tracker {
  private stowed = false;
  private calmS = 0;

  constructor(
    private readonly settings: TrackerSettings,
    private readonly latitudeRad: number,
    private readonly horizon: HorizonProfile,
  ) {}

  decide(
    sun: Readonly<SunPosition>,
    dniWm2: number,
    windMs: number,
    dtS: number,
    inService: boolean,
  ): number {
    requireRange('beam normal irradiance [W/m²]', dniWm2, 0, Number.MAX_VALUE);
    requireRange('wind speed [m/s]', windMs, 0, Number.MAX_VALUE);
    requireRange('sub-step [s]', dtS, Number.MIN_VALUE, Number.MAX_VALUE);
    this.watchWind(windMs, dtS);
    if (!inService) return TRACKER_STATE_INDEX.outOfService;
    if (!(sun.elevationRad > 0)) return TRACKER_STATE_INDEX.nightPark;
    // The sun's apparent place, because that is what a surveyed profile hides.
    if (sun.elevationRad <= this.horizon.elevationRad(sun.azimuthRad))
      return TRACKER_STATE_INDEX.belowHorizonProfile;
    if (this.stowed) return TRACKER_STATE_INDEX.windStow;
    if (!this.canPointAt(sun)) return TRACKER_STATE_INDEX.outOfTravel;
    if (dniWm2 < this.settings.startDniWm2) return TRACKER_STATE_INDEX.waiting;
    return TRACKER_STATE_INDEX.tracking;
  }

  private watchWind(windMs: number, dtS: number): void {
    const { stowWindMs, resumeWindMs, resumeAfterS } = this.settings;
    if (windMs >= stowWindMs) {
      this.stowed = true;
      this.calmS = 0;
    } else if (this.stowed && windMs >= resumeWindMs) {
      this.calmS = 0;
    } else if (this.stowed && this.calmS >= resumeAfterS - TIME_ROUND_OFF_S) {
      this.stowed = false;
      this.calmS = 0;
    } else if (this.stowed) {
      this.calmS += dtS;
    }
  }

  private canPointAt(sun: Readonly<SunPosition>): boolean {
    const { azimuthSpanRad, azimuthCentreOffsetRad, elevationMinRad, elevationMaxRad } = this.settings;
    if (sun.elevationRad < elevationMinRad || sun.elevationRad > elevationMaxRad) return false;
    const fromEquatorRad = azimuthFromEquatorRad(sun.azimuthRad, this.latitudeRad);
    const fromCentreRad = Math.abs(fromEquatorRad - azimuthCentreOffsetRad);
    // Both angles lie within ±π of the equator's direction, so the way round may be the shorter one.
    return Math.min(fromCentreRad, 2 * Math.PI - fromCentreRad) <= azimuthSpanRad / 2;
  }
}

function requireTrackerSettings(settings: TrackerSettings): void {
  requireRange('azimuth span [rad]', settings.azimuthSpanRad, Number.MIN_VALUE, 2 * Math.PI);
  requireRange('azimuth centre offset [rad]', settings.azimuthCentreOffsetRad, -Math.PI, Math.PI);
  requireRange('lowest elevation [rad]', settings.elevationMinRad, 0, Math.PI / 2);
  requireRange('highest elevation [rad]', settings.elevationMaxRad, settings.elevationMinRad, Math.PI / 2);
  requireRange('start threshold [W/m²]', settings.startDniWm2, 0, Number.MAX_VALUE);
  requireRange('stow wind [m/s]', settings.stowWindMs, Number.MIN_VALUE, Number.MAX_VALUE);
  requireRange('resume wind [m/s]', settings.resumeWindMs, Number.MIN_VALUE, settings.stowWindMs);
  requireRange('resume hold [s]', settings.resumeAfterS, 0, Number.MAX_VALUE);
}

/** Sub-steps that are not whole binary fractions of a second must not cost a step more [s]. */
const TIME_ROUND_OFF_S = 1e-6;
