import { loadDefinition } from './loads/index.js';
import { pipeProblems } from './pipes/index.js';
import type { CrossFieldProblem } from './problem.js';
import { receiverDefinition } from './receivers/index.js';
import type { Scenario } from './scenario.js';
import { sumOf } from './schedule.js';

/** What no single field can see: each rule names the field to change. */
export function crossFieldProblems(scenario: Scenario): CrossFieldProblem[] {
  const problems: CrossFieldProblem[] = [];
  const rule = (holds: boolean, path: string, message: string) => {
    if (!holds) problems.push({ path, message });
  };
  const { dish, tracker, receiver } = scenario.catch;
  const { pump, pipe, tank } = scenario.carryAndKeep;
  const { horizon } = scenario.place;

  const directions = new Map<number, number>();
  horizon.forEach(({ azimuthDeg }, index) => {
    const direction = azimuthDeg % 360;
    const before = directions.get(direction);
    rule(
      before === undefined,
      `place.horizon.${index}.azimuthDeg`,
      `This direction stands already in pair ${(before ?? 0) + 1}${azimuthDeg === 360 ? ' (360° is 0°)' : ''}: keep one of the two`,
    );
    if (before === undefined) directions.set(direction, index);
  });
  problems.push(...pipeProblems(pipe));
  problems.push(...receiverDefinition(receiver.kind).problems(receiver, dish.apertureDiameterM));
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
    problems.push(...loadDefinition(load.kind).problems(load, `use.loads.${index}`, tankLitres));
  });
  rule(
    sumOf(scenario.use.electricity.hourlyWeights) > 0,
    'use.electricity.hourlyWeights',
    'At least one hour needs a weight above 0',
  );
  return problems;
}
