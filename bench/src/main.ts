/**
 * `npm run bench`: how long one year takes at three steps with each receiver. Numbers to look at, never a test: they
 * belong to the machine named above the table.
 */
import { cpus, totalmem } from 'node:os';
import process from 'node:process';
import { JOULES_PER_KWH, ACCOUNT_INDEX, MODEL_VERSION, runYear, type RunResult } from '@noonwell/engine';
import { RECEIVER_KINDS, newScenario, toMachine, type ReceiverKind } from '@noonwell/schema';
import { syntheticYear } from '@noonwell/testkit';
import { summarise, type Spread } from './spread.js';
import { formatTable } from './table.js';

const STEP_MINUTES = [60, 5, 1] as const;
const REPEATS = 5;

interface Measured {
  readonly receiver: ReceiverKind;
  readonly stepMinutes: number;
  readonly time: Spread;
  readonly result: RunResult;
}

const weather = syntheticYear();

function measure(receiver: ReceiverKind, stepMinutes: (typeof STEP_MINUTES)[number]): Measured {
  const scenario = newScenario(receiver);
  scenario.simulation.stepMinutes = stepMinutes;
  const machine = toMachine(scenario);
  // The first year is left out: it is spent compiling.
  let result = runYear(machine, weather);
  const times = Array.from({ length: REPEATS }, () => {
    const started = performance.now();
    result = runYear(machine, weather);
    return performance.now() - started;
  });
  return { receiver, stepMinutes, time: summarise(times), result };
}

function row({ receiver, stepMinutes, time, result }: Measured, coarsest: Measured): string[] {
  const kwh = (joules: number | undefined): string => ((joules ?? 0) / JOULES_PER_KWH).toFixed(0);
  return [
    receiver,
    String(stepMinutes),
    time.median.toFixed(0),
    `${time.min.toFixed(0)}–${time.max.toFixed(0)}`,
    (time.median / coarsest.time.median).toFixed(1),
    kwh(result.accountsJ[ACCOUNT_INDEX.heatDelivered]),
    kwh(result.accountsJ[ACCOUNT_INDEX.powerAc]),
  ];
}

const [processor] = cpus();
process.stdout.write(
  [
    `Noonwell engine, model ${MODEL_VERSION}, one synthetic year of ${String(weather.startLocalMs.length)} hours, ${String(REPEATS)} repeats after one to warm up`,
    `Node ${process.version}, ${process.platform} ${process.arch}, ${String(cpus().length)} × ${processor?.model.trim() ?? 'unknown processor'}, ${(totalmem() / 2 ** 30).toFixed(0)} GiB`,
    '',
    '',
  ].join('\n'),
);
const rows = RECEIVER_KINDS.flatMap((receiver) => {
  const measured = STEP_MINUTES.map((minutes) => measure(receiver, minutes));
  return measured.map((each) => row(each, measured[0]!));
});
process.stdout.write(
  `${formatTable(['receiver', 'step min', 'median ms', 'min–max ms', '× 60 min', 'heat kWh', 'power AC kWh'], rows)}\n\n`,
);
process.stdout.write(
  `Peak memory of this process: ${(process.resourceUsage().maxRSS / 1024).toFixed(0)} MiB\n`,
);
