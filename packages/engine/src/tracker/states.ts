/**
 * The states of a tracked dish. Every sub-step is in exactly one of them, and the ledger has one line for the
 * beam met in each. New states are added at the end: stored results refer to them by position.
 *
 * - `nightPark`: the sun is not above the horizon.
 * - `waiting`: the beam is under the start threshold.
 * - `tracking`: on the sun.
 * - `windStow`: laid flat for the wind, or waiting for it to stay down.
 * - `outOfTravel`: the sun stands where the mount cannot point.
 * - `defocusedStoreFull`, `defocusedReceiverLimit`: off the sun because the heat is not wanted, or a part of
 *   the receiver is at its limit. Decided by the simulation from the store and the receiver, after the tracker.
 * - `belowHorizonProfile`: the sun is up, but behind the profile of the place.
 * - `outOfService`: a scheduled outage, by day and by night.
 */
export const TRACKER_STATES = [
  'nightPark',
  'waiting',
  'tracking',
  'windStow',
  'outOfTravel',
  'defocusedStoreFull',
  'defocusedReceiverLimit',
  'belowHorizonProfile',
  'outOfService',
] as const;

export type TrackerState = (typeof TRACKER_STATES)[number];

/** Position of each state in `TRACKER_STATES`: what the step loop stores and compares. */
export const TRACKER_STATE_INDEX = Object.freeze(
  Object.fromEntries(TRACKER_STATES.map((state, index) => [state, index])) as Record<TrackerState, number>,
);
