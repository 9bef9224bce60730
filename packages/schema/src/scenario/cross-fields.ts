import type { Scenario } from './scenario.js';

interface CrossFieldProblem {
  readonly path: (string | number)[];
  readonly message: string;
}

/** What no single field can see: each rule names the field to change. */
export function crossFieldProblems(scenario: Scenario): CrossFieldProblem[] {
  const problems: CrossFieldProblem[] = [];
  const require = (holds: boolean, path: string, message: string) => {
    if (!holds)
      problems.push({ path: path.split('.').map((key) => (/^\d+$/.test(key) ? Number(key) : key)), message });
  };
  const { dish, tracker, receiver } = scenario.catch;
  const { pump, tank } = scenario.carryAndKeep;

  const fitsBehindDish = (sideM: number) => sideM * Math.SQRT2 < dish.apertureDiameterM;
  require(fitsBehindDish(
    receiver.faceSideM,
  ), 'catch.receiver.faceSideM', 'The receiver is larger than the dish: its diagonal must be less than the aperture diameter');
  if (receiver.kind === 'cell' && receiver.secondary.kind === 'mixingDuct') {
    require(fitsBehindDish(
      receiver.secondary.entrySideM,
    ), 'catch.receiver.secondary.entrySideM', "The duct's entry is larger than the dish: its diagonal must be less than the aperture diameter");
  }
  if (receiver.kind === 'cell') {
    require(receiver.inverterStandingLossFraction <=
      1 / receiver.inverterEfficiency -
        1, 'catch.receiver.inverterStandingLossFraction', 'The standing loss alone is more than the whole loss at the rating: lower it or the efficiency');
  }
  require(tracker.elevationMinDeg <
    tracker.elevationMaxDeg, 'catch.tracker.elevationMaxDeg', 'The highest elevation must be above the lowest');
  require(tracker.resumeWindMs <=
    tracker.stowWindMs, 'catch.tracker.resumeWindMs', 'The resume wind must not be above the stow wind');
  require(pump.minFlowKgS <
    pump.maxFlowKgS, 'carryAndKeep.pump.maxFlowKgS', 'The greatest flow must be above the least flow');
  require(pump.setPointC <
    pump.outletLimitC, 'carryAndKeep.pump.outletLimitC', 'The outlet limit must be above the outlet set point');
  require(pump.stopDifferenceK <
    pump.startDifferenceK, 'carryAndKeep.pump.stopDifferenceK', 'The stop difference must be below the start difference');
  require(tank.initialTemperatureC <
    tank.topLimitC, 'carryAndKeep.tank.initialTemperatureC', 'The tank must start below the temperature at which it counts as full');
  scenario.use.loads.forEach((load, index) => {
    require(sum(load.hourlyWeights) >
      0, `use.loads.${index}.hourlyWeights`, 'At least one hour needs a weight above 0');
  });
  require(sum(scenario.use.electricity.hourlyWeights) >
    0, 'use.electricity.hourlyWeights', 'At least one hour needs a weight above 0');
  return problems;
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
