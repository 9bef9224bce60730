import { recordCalendar, type RecordCalendar } from '../calendar.js';
import { createDispatch, dispatchPower } from '../electricity/dispatch.js';
import { siteUseW } from '../electricity/use.js';
import { DomainError, RunError } from '../errors.js';
import { RESIDUAL_LIMIT, ROUND_OFF, findImbalance, findImbalances } from '../ledger/balance.js';
import { LEDGER_INDEX } from '../ledger/lines.js';
import type { Load } from '../load/load.js';
import { createLoad } from '../load/registry.js';
import { dayAtMiddle } from '../ground/surface-wave.js';
import { Loop } from '../loop/loop.js';
import { createPipeSurroundings } from '../loop/pipe-registry.js';
import type { Machine } from '../machine.js';
import { createMains } from '../mains/burch-christensen.js';
import { MODEL_VERSION } from '../model-version.js';
import { apertureAreaM2, rimAngleRad } from '../optics/dish.js';
import { HorizonProfile } from '../place/horizon.js';
import { createReceiverStep, type Receiver } from '../receivers/receiver.js';
import { createReceiver } from '../receivers/registry.js';
import { createTank, createTankStep, type Tank } from '../store/stratified-tank.js';
import { emptySunPosition, sunPosition, type SunPosition } from '../sun/position.js';
import { spreadBeam } from '../sun/sunlit-substeps.js';
import { TRACKER_STATES, TRACKER_STATE_INDEX } from '../tracker/states.js';
import { outageRecords } from '../tracker/outage.js';
import { createTracker, type Tracker } from '../tracker/tracker.js';
import type { WeatherYear } from '../weather-year.js';
import { requireWeather, stepsPerRecord } from './check-input.js';
import { DishLedger } from './dish-ledger.js';
import { keepLoop, keepPower, keepReceiver, keepStoreAndLoad, type PowerUse } from './keep-ledger.js';
import { Recorder } from './recorder.js';
import type { RunResult } from './result.js';
import { Watch } from './watch.js';

/** A run that goes on record by record, so that its caller can report progress and stop it. */
export interface YearRun {
  readonly records: number;
  readonly done: number;
  /** Energies so far [J], in the order of ACCOUNTS; what `finish` checks. */
  readonly accountsJ: Float64Array;
  /** Runs up to so many more records. */
  advance(records: number): void;
  /** Checks the ledger and gives the result; throws a RunError while records are left or a part does not balance. */
  finish(): RunResult;
}

/** Runs a machine through a weather year in one go. */
export function runYear(machine: Machine, weather: WeatherYear): RunResult {
  const run = createYearRun(machine, weather);
  run.advance(run.records);
  return run.finish();
}

/**
 * Sets a machine up for a weather year.
 * @throws DomainError for an impossible machine, weather or step
 */
export function createYearRun(machine: Machine, weather: WeatherYear): YearRun {
  return new Simulation(machine, weather);
}

const DEG = Math.PI / 180;
/** Irradiance over which a dark record's residual is judged: a record without beam must balance as well as a sunny one [W/m²]. */
const FULL_SUN_WM2 = 1000;
/** Where a parked dish's face looks: straight down [rad]. */
const PARKED_TILT_RAD = Math.PI / 2;

/** Lines of the beam met in each state of the tracker, in the order of TRACKER_STATES; tracking has its own chain. */
const STATE_LINE = TRACKER_STATES.map((state) => (state === 'tracking' ? -1 : LEDGER_INDEX[state]));

class Simulation implements YearRun {
  readonly records: number;
  done = 0;

  private readonly intervalS: number;
  private readonly steps: number;
  private readonly apertureM2: number;
  private readonly calendar: RecordCalendar;
  private readonly tracker: Tracker;
  private readonly outage: Uint8Array;
  private readonly receiver: Receiver;
  private readonly receiverStep = createReceiverStep();
  private readonly dishLedger: DishLedger;
  private readonly loop: Loop;
  private readonly tank: Tank;
  private readonly tankStep = createTankStep();
  private readonly layerKg: number;
  private readonly load: Load;
  private readonly siteUseW: Float64Array;
  private readonly dispatch = createDispatch();
  private readonly use: PowerUse = { siteW: 0, pumpW: 0, trackerW: 0 };
  private readonly recorder: Recorder;
  private readonly watch: Watch;

  private readonly suns: SunPosition[];
  private readonly sunlit: Uint8Array;
  private readonly stepDniWm2: Float64Array;
  private readonly stateSeconds = new Float64Array(TRACKER_STATES.length);

  private storeFull = false;
  private tankEnergyJ: number;
  private tankEnergyMaxJ = 0;

  constructor(
    private readonly machine: Machine,
    private readonly weather: WeatherYear,
  ) {
    requireWeather(weather);
    this.records = weather.startLocalMs.length;
    this.intervalS = weather.intervalMinutes * 60;
    this.steps = stepsPerRecord(machine, weather);
    this.apertureM2 = apertureAreaM2(machine.dish);
    this.calendar = recordCalendar(weather);
    this.tracker = createTracker(
      machine.tracker,
      weather.latitudeDeg * DEG,
      new HorizonProfile(machine.place.horizon),
    );
    this.outage = outageRecords(machine.outages, weather.startLocalMs);

    const airC = weather.dryBulbC[0]!;
    this.receiver = createReceiver(machine.receiver, machine.dish, airC);
    this.receiverStep.faceC = airC;
    this.dishLedger = new DishLedger(machine.dish, this.receiver.optics);
    const aroundPipes = createPipeSurroundings(machine.loop.pipe, weather);
    this.loop = new Loop(
      machine.loop,
      this.receiver,
      this.receiverStep,
      aroundPipes,
      aroundPipes.outsideC(airC, this.dayOf(0)),
    );
    this.tank = createTank(machine.tank, machine.store.initialC);
    this.layerKg = this.tank.massKg / this.tank.layers;
    this.tankEnergyJ = this.tank.energyJ();
    this.load = createLoad(machine.load, this.calendar, createMains(weather));
    this.siteUseW = siteUseW(machine.electricityUse, this.calendar, this.intervalS);
    this.recorder = new Recorder(weather.startLocalMs, this.calendar, this.intervalS, this.tank.layers);

    this.suns = Array.from({ length: this.steps }, emptySunPosition);
    this.sunlit = new Uint8Array(this.steps);
    this.stepDniWm2 = new Float64Array(this.steps);
    this.watch = new Watch(this.tank.layers);
  }

  get accountsJ(): Float64Array {
    return this.recorder.yearJ;
  }

  advance(records: number): void {
    const end = Math.min(this.records, this.done + records);
    while (this.done < end) {
      try {
        this.runRecord(this.done);
      } catch (error) {
        if (error instanceof RunError) throw error;
        throw new RunError('calculation', this.done, error instanceof Error ? error.message : String(error));
      }
      this.done++;
    }
  }

  private runRecord(record: number): void {
    const { weather, receiverStep, tankStep } = this;
    receiverStep.airC = weather.dryBulbC[record]!;
    receiverStep.windMs = weather.windMs[record]!;
    receiverStep.pressurePa = weather.pressurePa[record]!;
    tankStep.surroundingsC = weather.dryBulbC[record]!;
    this.loop.beginRecord(this.dayOf(record));
    this.load.ask(record, tankStep);
    this.placeSun(record);
    this.watch.beginRecord();

    for (let step = 0; step < this.steps; step++) this.runStep(record, step);
    this.endRecord(record);
  }

  private dayOf(record: number): number {
    return dayAtMiddle(this.weather.startLocalMs[record]!, this.weather.intervalMinutes);
  }

  /** Sun and beam of each sub-step: a sunrise's beam belongs to the sunlit part of its record. */
  private placeSun(record: number): void {
    const { weather } = this;
    const firstMidpointMs =
      weather.startLocalMs[record]! - weather.utcOffsetHours * 3_600_000 + this.machine.stepS * 500;
    for (let step = 0; step < this.steps; step++) {
      sunPosition(
        firstMidpointMs + step * this.machine.stepS * 1000,
        weather.latitudeDeg * DEG,
        weather.longitudeDeg * DEG,
        weather.pressurePa[record]!,
        weather.dryBulbC[record]!,
        this.suns[step]!,
      );
      this.sunlit[step] = this.suns[step]!.elevationRad > 0 ? 1 : 0;
    }
    spreadBeam(weather.dniWm2[record]!, this.sunlit, this.stepDniWm2);
  }

  /**
   * One step, cut into equal parts where the loop would move more than a layer of the tank: the loop sees the
   * bottom layer as it stood when its part began, so that layer must not turn over unseen.
   */
  private runStep(record: number, step: number): void {
    const { receiverStep, tankStep } = this;
    const sun = this.suns[step]!;
    const dniWm2 = this.stepDniWm2[step]!;
    const beamW = dniWm2 * this.apertureM2;
    receiverStep.dtS = this.machine.stepS;
    const mounted = this.tracker.decide(
      sun,
      dniWm2,
      receiverStep.windMs,
      receiverStep.dtS,
      this.outage[record] === 0,
    );
    let state = this.collect(mounted, sun, beamW);
    const parts = Math.max(1, Math.ceil((this.loop.flowKgS * receiverStep.dtS) / this.layerKg));
    const dtS = receiverStep.dtS / parts;
    receiverStep.dtS = dtS;
    tankStep.dtS = dtS;
    for (let part = 0; part < parts; part++) {
      if (parts > 1) state = this.collect(mounted, sun, beamW);
      this.loop.commit();
      const tracking = state === TRACKER_STATE_INDEX.tracking;
      this.stateSeconds[state]! += dtS;
      this.keepDish(state, beamW * dtS);
      keepReceiver(this.recorder.recordJ, receiverStep);
      keepLoop(this.recorder.recordJ, this.loop, dtS);
      this.chargeAndDraw();
      this.usePower(this.siteUseW[record]!, tracking);
      this.watch.see(receiverStep, this.loop, tracking);
    }
  }

  /** The state that the mount's state, the store and the receiver's limits leave; solves receiver and loop under it. */
  private collect(mounted: number, sun: SunPosition, beamW: number): number {
    const { loop, receiverStep, tank } = this;
    let state = mounted;
    const bottomC = tank.bottomC;
    if (state === TRACKER_STATE_INDEX.tracking && this.topLayerFull())
      state = TRACKER_STATE_INDEX.defocusedStoreFull;
    if (state === TRACKER_STATE_INDEX.tracking) {
      receiverStep.incidentW = beamW * this.dishLedger.incidentShare;
      receiverStep.absorbedW = beamW * this.dishLedger.absorbedShare;
      receiverStep.tiltDownRad = Math.max(0, sun.elevationRad);
      loop.solve(bottomC);
      if (loop.outletOverLimit) state = TRACKER_STATE_INDEX.defocusedStoreFull;
      else if (this.receiver.overLimit(receiverStep)) state = TRACKER_STATE_INDEX.defocusedReceiverLimit;
    }
    if (state !== TRACKER_STATE_INDEX.tracking) {
      receiverStep.incidentW = 0;
      receiverStep.absorbedW = 0;
      receiverStep.tiltDownRad = PARKED_TILT_RAD;
      loop.solve(bottomC);
    }
    return state;
  }

  private topLayerFull(): boolean {
    const { topLimitC, topHysteresisK } = this.machine.store;
    this.storeFull = this.tank.topC >= (this.storeFull ? topLimitC - topHysteresisK : topLimitC);
    return this.storeFull;
  }

  private keepDish(state: number, beamJ: number): void {
    const ledger = this.recorder.recordJ;
    ledger[LEDGER_INDEX.beamOnAperture]! += beamJ;
    const line = STATE_LINE[state]!;
    if (line >= 0) ledger[line]! += beamJ;
    else this.dishLedger.addTracking(ledger, beamJ);
  }

  private chargeAndDraw(): void {
    const { tankStep: step, tank, load } = this;
    step.chargeFlowKgS = this.loop.flowKgS;
    step.chargeEnthalpyRiseJkg = this.loop.enthalpyRiseJkg;
    tank.step(step);
    load.settle(step);
    const energyJ = tank.energyJ();
    keepStoreAndLoad(this.recorder.recordJ, step, energyJ - this.tankEnergyJ, load);
    this.tankEnergyJ = energyJ;
    this.tankEnergyMaxJ = Math.max(this.tankEnergyMaxJ, Math.abs(energyJ));
  }

  private usePower(siteW: number, tracking: boolean): void {
    const { dispatch, use, receiverStep, receiver } = this;
    const { standbyW, movingW } = this.machine.trackerPower;
    use.siteW = siteW;
    use.pumpW = this.loop.pumpW;
    use.trackerW = standbyW + (tracking ? movingW : 0);
    dispatchPower(receiverStep.powerDcW, receiver.inverter, use.siteW + use.pumpW + use.trackerW, dispatch);
    keepPower(this.recorder.recordJ, use, dispatch, receiverStep.dtS);
  }

  private endRecord(record: number): void {
    this.requireBalance(record);
    this.recorder.close(record);
    const elevationDeg = this.suns[this.steps >> 1]!.elevationRad / DEG;
    this.watch.endRecord(record, this.intervalS, this.weather, elevationDeg, this.tank, this.recorder.hourly);
  }

  /**
   * Largest accepted residual over a time with the given beam [J]. A time without beam has to balance too, so
   * the beam never counts less than one record of full sun; a large store's own
   * round-off, which grows as a random walk, comes on top.
   */
  private residualLimitJ(beamJ: number): number {
    const leastBeamJ = FULL_SUN_WM2 * this.apertureM2 * this.intervalS;
    return (
      RESIDUAL_LIMIT * Math.max(beamJ, leastBeamJ) +
      ROUND_OFF * this.tankEnergyMaxJ * Math.sqrt((this.done + 1) * this.steps)
    );
  }

  private requireBalance(record: number): void {
    const limitJ = this.residualLimitJ(0);
    const imbalance = findImbalance(this.recorder.recordJ, limitJ);
    if (imbalance) {
      throw new RunError(
        imbalance.part,
        record,
        `the energy balance is off by ${imbalance.residual} J (limit ${limitJ} J)`,
      );
    }
  }

  finish(): RunResult {
    if (this.done < this.records) throw new DomainError('records run', this.done, `all ${this.records}`);
    const { weather, recorder, machine } = this;
    const beamJ = recorder.yearJ[LEDGER_INDEX.beamOnAperture]!;
    const limitJ = this.residualLimitJ(beamJ);
    const imbalances = findImbalances(recorder.yearJ, limitJ);
    if (imbalances.length > 0) {
      const parts = imbalances.map(({ part }) => part).join(' and ');
      const sizes = imbalances.map(({ part, residual }) => `${part} ${residual} J`).join(', ');
      throw new RunError(
        parts,
        this.records - 1,
        `the energy balance of the whole run is off: ${sizes} (limit ${limitJ} J)`,
      );
    }
    const area = this.receiver.optics.openingAreaM2;
    return {
      modelVersion: MODEL_VERSION,
      stepS: machine.stepS,
      intervalS: this.intervalS,
      records: this.records,
      weather: {
        latitudeDeg: weather.latitudeDeg,
        longitudeDeg: weather.longitudeDeg,
        altitudeM: weather.altitudeM,
        dniJm2: weather.dniWm2.reduce((sum, dni) => sum + dni, 0) * this.intervalS,
        dryBulbMeanC: weather.dryBulbC.reduce((sum, airC) => sum + airC, 0) / this.records,
      },
      apertureAreaM2: this.apertureM2,
      rimAngleRad: rimAngleRad(machine.dish),
      interceptFactor: this.receiver.optics.interceptFactor,
      geometricConcentration: this.apertureM2 / area,
      accountsJ: Float64Array.from(recorder.yearJ),
      monthlyAccountsJ: Float64Array.from(recorder.monthlyJ),
      trackerSeconds: Object.fromEntries(
        TRACKER_STATES.map((state, index) => [state, this.stateSeconds[index]!]),
      ) as RunResult['trackerSeconds'],
      pumpSeconds: this.watch.pumpSeconds,
      pipeFreezeSeconds: this.watch.pipeFreezeSeconds,
      faceMaxC: this.watch.faceMaxC,
      cellMaxC: this.receiver.hasCells ? this.watch.cellMaxC : null,
      tankTopMaxC: this.watch.tankTopMaxC,
      outletMaxC: this.watch.outletMaxC,
      hourly: recorder.hourly,
    };
  }
}
