import type { Scenario } from './scenario.js';

interface CrossFieldProblem {
  readonly path: (string | number)[];
  readonly message: string;
}

/** What no single field can see: each rule names the field to change. */
export function crossFieldProblems(scenario: Scenario): CrossFieldProblem[] {
  const problems: CrossFieldProblem[] = [];
  const rule = (holds: boolean, path: string, message: string) => {
    if (!holds)
      problems.push({ path: path.split('.').map((key) => (/^\d+$/.test(key) ? Number(key) : key)), message });
  };
  const { dish, tracker, receiver } = scenario.catch;
  const { pump, tank } = scenario.carryAndKeep;

  const fitsBehindDish = (sideM: number) => sideM * Math.SQRT2 < dish.apertureDiameterM;
  rule(
    fitsBehindDish(receiver.faceSideM),
    'catch.receiver.faceSideM',
    'The receiver is larger than the dish: its diagonal must be less than the aperture diameter',
  );
  if (receiver.kind === 'cell' && receiver.secondary.kind === 'mixingDuct') {
    rule(
      fitsBehindDish(receiver.secondary.entrySideM),
      'catch.receiver.secondary.entrySideM',
      "The duct's entry is larger than the dish: its diagonal must be less than the aperture diameter",
    );
  }
  if (receiver.kind === 'cell') {
    rule(
      receiver.inverterStandingLossFraction <= 1 / receiver.inverterEfficiency - 1,
      'catch.receiver.inverterStandingLossFraction',
      'The standing loss alone is more than the whole loss at the rating: lower it or the efficiency',
    );
  }
  rule(
    tracker.elevationMinDeg < tracker.elevationMaxDeg,
    'catch.tracker.elevationMaxDeg',
    'The highest elevation must be above the lowest',
  );
  rule(
    tracker.resumeWindMs <= tracker.stowWindMs,
    'catch.tracker.resumeWindMs',
    'The resume wind must not be above the stow wind',
  );
  rule(
    pump.minFlowKgS < pump.maxFlowKgS,
    'carryAndKeep.pump.maxFlowKgS',
    'The greatest flow must be above the least flow',
  );
  rule(
    pump.setPointC < pump.outletLimitC,
    'carryAndKeep.pump.outletLimitC',
    'The outlet limit must be above the outlet set point',
  );
  rule(
    pump.stopDifferenceK < pump.startDifferenceK,
    'carryAndKeep.pump.stopDifferenceK',
    'The stop difference must be below the start difference',
  );
  rule(
    tank.initialTemperatureC < tank.topLimitC,
    'carryAndKeep.tank.initialTemperatureC',
    'The tank must start below the temperature at which it counts as full',
  );
  const tankLitres = tank.volumeM3 * 1000;
  rule(
    pump.maxFlowKgS * 120 <= tankLitres,
    'carryAndKeep.pump.maxFlowKgS',
    'The pump would exchange the whole tank within two minutes: lower the greatest flow or enlarge the tank',
  );
  scenario.use.loads.forEach((load, index) => {
    rule(
      peakLitresPerMinute(load) <= tankLitres,
      `use.loads.${index}.litresPerDay`,
      'The busiest hour would draw the whole tank within a minute: lower the draw or enlarge the tank',
    );
    rule(
      sum(load.hourlyWeights) > 0,
      `use.loads.${index}.hourlyWeights`,
      'At least one hour needs a weight above 0',
    );
  });
  rule(
    sum(scenario.use.electricity.hourlyWeights) > 0,
    'use.electricity.hourlyWeights',
    'At least one hour needs a weight above 0',
  );
  return problems;
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}

function peakLitresPerMinute(load: Scenario['use']['loads'][number]): number {
  const peakShare = Math.max(...load.hourlyWeights) / Math.max(sum(load.hourlyWeights), Number.MIN_VALUE);
  const busiestDay = Math.max(...load.monthFactors) * Math.max(1, load.weekendFactor);
  return (load.litresPerDay * busiestDay * peakShare) / 60;
}
