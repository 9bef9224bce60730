import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propertyRuns } from '../../validation/property-runs.js';
import { DomainError } from '../errors.js';
import type { SunPosition } from '../sun/position.js';
import { TRACKER_STATE_INDEX, TRACKER_STATES, type TrackerState } from './states.js';
import { HorizonProfile, type HorizonPoint } from '../place/horizon.js';
import { createTracker as createWithHorizon, type Tracker, type TrackerSettings } from './tracker.js';

const RAD = Math.PI / 180;
const NORTH = 40 * RAD;
const SOUTH = -35 * RAD;

const createTracker = (
  wanted: TrackerSettings,
  latitudeRad: number,
  horizon: readonly HorizonPoint[] = [],
): Tracker => createWithHorizon(wanted, latitudeRad, new HorizonProfile(horizon));

const settings = (change: Partial<TrackerSettings> = {}): TrackerSettings => ({
  azimuthSpanRad: 250 * RAD,
  azimuthCentreOffsetRad: 0,
  elevationMinRad: 5 * RAD,
  elevationMaxRad: 90 * RAD,
  startDniWm2: 100,
  stowWindMs: 13,
  resumeWindMs: 11,
  resumeAfterS: 900,
  ...change,
});

const sunAt = (elevationDeg: number, azimuthDeg: number): SunPosition => ({
  elevationRad: elevationDeg * RAD,
  trueElevationRad: elevationDeg * RAD,
  azimuthRad: azimuthDeg * RAD,
});
const HIGH = sunAt(50, 180);

const stateOf = (
  tracker: Tracker,
  { sun = HIGH, dniWm2 = 800, windMs = 3, dtS = 300, inService = true }: Partial<Step> = {},
): TrackerState => TRACKER_STATES[tracker.decide(sun, dniWm2, windMs, dtS, inService)]!;
interface Step {
  sun: SunPosition;
  dniWm2: number;
  windMs: number;
  dtS: number;
  inService: boolean;
}
const statesInWind = (tracker: Tracker, winds: readonly number[], dtS = 300): TrackerState[] =>
  winds.map((windMs) => stateOf(tracker, { windMs, dtS }));

describe('travel', () => {
  // Span 250°: 125° either side of the middle.
  it.each([
    ['north', NORTH, 180 - 124.9, 'tracking'],
    ['north', NORTH, 180 - 125.1, 'outOfTravel'],
    ['north', NORTH, 180 + 124.9, 'tracking'],
    ['north', NORTH, 180 + 125.1, 'outOfTravel'],
    ['north', NORTH, 0, 'outOfTravel'],
    ['south', SOUTH, 124.9, 'tracking'],
    ['south', SOUTH, 125.1, 'outOfTravel'],
    ['south', SOUTH, 360 - 124.9, 'tracking'],
    ['south', SOUTH, 360 - 125.1, 'outOfTravel'],
    ['south', SOUTH, 180, 'outOfTravel'],
  ] as const)(
    'centred on the equator in the %s (%f rad): azimuth %f° is %s',
    (_side, latitude, azimuth, state) => {
      expect(stateOf(createTracker(settings(), latitude), { sun: sunAt(30, azimuth) })).toBe(state);
    },
  );

  it('turns with its centre, through north where it has to', () => {
    const shifted = settings({ azimuthSpanRad: 90 * RAD, azimuthCentreOffsetRad: 170 * RAD });
    // Middle at 180 + 170 = 350°: from 305° over north to 35°.
    for (const [azimuthDeg, state] of [
      [304, 'outOfTravel'],
      [306, 'tracking'],
      [0, 'tracking'],
      [34, 'tracking'],
      [36, 'outOfTravel'],
    ] as const) {
      expect(stateOf(createTracker(shifted, NORTH), { sun: sunAt(30, azimuthDeg) })).toBe(state);
    }
  });

  it('reaches every azimuth with a full turn', () => {
    const full = settings({ azimuthSpanRad: 2 * Math.PI, azimuthCentreOffsetRad: 1 });
    for (let azimuthDeg = 0; azimuthDeg < 360; azimuthDeg += 7) {
      expect(stateOf(createTracker(full, SOUTH), { sun: sunAt(30, azimuthDeg) })).toBe('tracking');
    }
  });

  it('keeps to its elevations', () => {
    const low = settings({ elevationMinRad: 5 * RAD, elevationMaxRad: 80 * RAD });
    expect(stateOf(createTracker(low, NORTH), { sun: sunAt(4.9, 180) })).toBe('outOfTravel');
    expect(stateOf(createTracker(low, NORTH), { sun: sunAt(5.1, 180) })).toBe('tracking');
    expect(stateOf(createTracker(low, NORTH), { sun: sunAt(80.1, 180) })).toBe('outOfTravel');
  });
});

describe('start threshold', () => {
  it('waits below it and tracks from it on', () => {
    const tracker = createTracker(settings(), NORTH);
    expect(stateOf(tracker, { dniWm2: 99.9 })).toBe('waiting');
    expect(stateOf(tracker, { dniWm2: 100 })).toBe('tracking');
    expect(stateOf(createTracker(settings({ startDniWm2: 0 }), NORTH), { dniWm2: 0 })).toBe('tracking');
  });
});

describe('wind', () => {
  it('stows from the stow speed on and stays so between the two speeds', () => {
    const tracker = createTracker(settings(), NORTH);
    expect(statesInWind(tracker, [12.9, 13, 12, 12, 12, 12, 12])).toEqual([
      'tracking',
      ...Array<string>(6).fill('windStow'),
    ]);
  });

  it('resumes after a quarter of an hour of calm, whatever the step', () => {
    const calmStepsStowed = (dtS: number): number => {
      const tracker = createTracker(settings(), NORTH);
      const states = statesInWind(tracker, [14, ...Array<number>(40).fill(5)], dtS);
      return states.filter((state) => state === 'windStow').length - 1;
    };
    expect(calmStepsStowed(300) * 300).toBe(900);
    expect(calmStepsStowed(150) * 150).toBe(900);
    expect(calmStepsStowed(60) * 60).toBe(900);
    // Eleven times 900/11 s add up to a hair less than 900 s.
    expect(calmStepsStowed(900 / 11)).toBe(11);
  });

  it('counts the calm from the beginning after a gust above the resume speed', () => {
    const tracker = createTracker(settings(), NORTH);
    expect(statesInWind(tracker, [13, 5, 5, 11, 5, 5, 5, 5])).toEqual([
      ...Array<string>(7).fill('windStow'),
      'tracking',
    ]);
  });

  it('resumes with the first calm step where no hold is asked', () => {
    const tracker = createTracker(settings({ resumeAfterS: 0 }), NORTH);
    expect(statesInWind(tracker, [13, 11, 10.9, 12.9])).toEqual([
      'windStow',
      'windStow',
      'tracking',
      'tracking',
    ]);
  });

  it('is watched at night: a stormy dawn finds the dish stowed, a calm one does not', () => {
    const night = { sun: sunAt(-5, 60) };
    const stormy = createTracker(settings(), NORTH);
    expect(stateOf(stormy, { ...night, windMs: 15 })).toBe('nightPark');
    expect(stateOf(stormy)).toBe('windStow');
    const calmed = createTracker(settings(), NORTH);
    for (const windMs of [15, 5, 5, 5]) stateOf(calmed, { ...night, windMs });
    expect(stateOf(calmed)).toBe('tracking');
  });
});

describe('horizon profile', () => {
  const hill = [
    { azimuthRad: 90 * RAD, elevationRad: 0 },
    { azimuthRad: 120 * RAD, elevationRad: 20 * RAD },
    { azimuthRad: 150 * RAD, elevationRad: 0 },
  ];

  it('hides the sun behind it, and only there', () => {
    const tracker = createTracker(settings(), NORTH, hill);
    expect(stateOf(tracker, { sun: sunAt(19.9, 120) })).toBe('belowHorizonProfile');
    expect(stateOf(tracker, { sun: sunAt(20.1, 120) })).toBe('tracking');
    expect(stateOf(tracker, { sun: sunAt(9.9, 105) })).toBe('belowHorizonProfile');
    expect(stateOf(tracker, { sun: sunAt(10.1, 105) })).toBe('tracking');
    expect(stateOf(tracker, { sun: sunAt(9.9, 200) })).toBe('tracking');
  });

  it('leaves a level horizon as it was: the sun at 0° is night, just above it is not hidden', () => {
    const level = [{ azimuthRad: 0, elevationRad: 0 }];
    const tracker = createTracker(settings({ elevationMinRad: 0 }), NORTH, level);
    expect(stateOf(tracker, { sun: sunAt(0, 180) })).toBe('nightPark');
    expect(stateOf(tracker, { sun: sunAt(0.001, 180) })).toBe('tracking');
  });
});

describe('scheduled outage', () => {
  it('is out of service by day and by night, and remembers the storm that blew meanwhile', () => {
    const tracker = createTracker(settings(), NORTH);
    expect(stateOf(tracker, { inService: false })).toBe('outOfService');
    expect(stateOf(tracker, { inService: false, sun: sunAt(-5, 0), windMs: 20 })).toBe('outOfService');
    expect(stateOf(tracker)).toBe('windStow');
  });
});

describe('order of the states', () => {
  it('is out of service, night park, below the profile, wind stow, out of travel, waiting, tracking', () => {
    const walled = createTracker(settings(), NORTH, [{ azimuthRad: 0, elevationRad: 3 * RAD }]);
    const calmless = { windMs: 20, dniWm2: 0 };
    expect(stateOf(walled, { ...calmless, sun: sunAt(-1, 0), inService: false })).toBe('outOfService');
    expect(stateOf(walled, { ...calmless, sun: sunAt(-1, 0) })).toBe('nightPark');
    expect(stateOf(walled, { ...calmless, sun: sunAt(2, 0) })).toBe('belowHorizonProfile');
    expect(stateOf(walled, { ...calmless, sun: sunAt(4, 0) })).toBe('windStow');
  });

  it('is night park, wind stow, out of travel, waiting, tracking under a level horizon', () => {
    const tracker = createTracker(settings({ resumeAfterS: 0 }), NORTH);
    const storm = 20;
    expect(stateOf(tracker, { sun: sunAt(0, 0), windMs: storm, dniWm2: 0 })).toBe('nightPark');
    expect(stateOf(tracker, { sun: sunAt(2, 0), windMs: storm, dniWm2: 0 })).toBe('windStow');
    expect(stateOf(tracker, { sun: sunAt(2, 0), dniWm2: 0 })).toBe('outOfTravel');
    expect(stateOf(tracker, { dniWm2: 0 })).toBe('waiting');
    expect(stateOf(tracker)).toBe('tracking');
  });

  it('counts every sub-step in exactly one state, and only in those the tracker decides', () => {
    const step = fc.record({
      elevationDeg: fc.double({ min: -90, max: 90, noNaN: true }),
      azimuthDeg: fc.double({ min: 0, max: 360, noNaN: true, maxExcluded: true }),
      dniWm2: fc.double({ min: 0, max: 1200, noNaN: true }),
      windMs: fc.double({ min: 0, max: 30, noNaN: true }),
      inService: fc.boolean(),
    });
    fc.assert(
      fc.property(fc.array(step, { minLength: 1, maxLength: 200 }), (steps) => {
        const tracker = createTracker(settings(), SOUTH, [{ azimuthRad: 1, elevationRad: 0.2 }]);
        const hours = new Float64Array(TRACKER_STATES.length);
        let mayCatch = 0;
        let outOfService = 0;
        for (const { elevationDeg, azimuthDeg, dniWm2, windMs, inService } of steps) {
          const state = tracker.decide(sunAt(elevationDeg, azimuthDeg), dniWm2, windMs, 300, inService);
          hours[state]! += 1;
          if (inService && elevationDeg > 0.2 / RAD && dniWm2 >= 100 && windMs < 13) mayCatch++;
          if (!inService) outOfService++;
        }
        expect(hours.reduce((sum, count) => sum + count, 0)).toBe(steps.length);
        expect(hours[TRACKER_STATE_INDEX.tracking]!).toBeLessThanOrEqual(mayCatch);
        expect(hours[TRACKER_STATE_INDEX.outOfService]).toBe(outOfService);
        expect(hours[TRACKER_STATE_INDEX.defocusedStoreFull]).toBe(0);
        expect(hours[TRACKER_STATE_INDEX.defocusedReceiverLimit]).toBe(0);
      }),
      propertyRuns,
    );
  });

  it('repeats itself: the same steps give the same states', () => {
    const winds = [3, 14, 9, 9, 12, 9, 9, 9, 9, 13, 2];
    expect(statesInWind(createTracker(settings(), NORTH), winds)).toEqual(
      statesInWind(createTracker(settings(), NORTH), winds),
    );
  });
});

describe('refusals', () => {
  it.each([
    ['azimuth span', { azimuthSpanRad: 0 }],
    ['azimuth span', { azimuthSpanRad: 7 }],
    ['azimuth centre', { azimuthCentreOffsetRad: 4 }],
    ['lowest elevation', { elevationMinRad: -0.1 }],
    ['highest elevation', { elevationMinRad: 0.5, elevationMaxRad: 0.4 }],
    ['start threshold', { startDniWm2: NaN }],
    ['stow wind', { stowWindMs: 0 }],
    ['resume wind', { resumeWindMs: 14 }],
    ['resume hold', { resumeAfterS: -1 }],
  ] as const)('names the setting: %s %o', (name, change) => {
    const create = (): Tracker => createTracker(settings(change), NORTH);
    expect(create).toThrow(DomainError);
    expect(create).toThrow(name);
  });

  it.each([
    ['wind speed', { windMs: NaN }],
    ['beam normal', { dniWm2: -1 }],
    ['sub-step', { dtS: 0 }],
  ] as const)('names the input of a step: %s', (name, change) => {
    expect(() => stateOf(createTracker(settings(), NORTH), change)).toThrow(name);
  });

  it('refuses a latitude beyond the poles', () => {
    expect(() => createTracker(settings(), 2)).toThrow('latitude');
  });
});
