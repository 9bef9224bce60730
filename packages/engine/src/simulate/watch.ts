import type { Loop } from '../loop/loop.js';
import type { ReceiverStep } from '../receivers/receiver.js';
import type { Tank } from '../store/stratified-tank.js';
import type { WeatherYear } from '../weather-year.js';
import type { HourlyColumns } from './result.js';

/** Watches temperatures, flow and time on the sun: within a record for its columns, over the run for its extremes. */
export class Watch {
  pumpSeconds = 0;
  pipeFreezeSeconds = 0;
  faceMaxC = -Infinity;
  cellMaxC = -Infinity;
  tankTopMaxC = -Infinity;
  outletMaxC = 0;
  private trackingS = 0;
  private flowKg = 0;
  private recordFaceC = -Infinity;
  private recordCellC = -Infinity;
  private recordOutletC = 0;
  private readonly layersC: Float64Array;

  constructor(layers: number) {
    this.layersC = new Float64Array(layers);
  }

  beginRecord(): void {
    this.trackingS = 0;
    this.flowKg = 0;
    this.recordFaceC = -Infinity;
    this.recordCellC = -Infinity;
    this.recordOutletC = 0;
  }

  see(receiver: ReceiverStep, loop: Loop, tracking: boolean): void {
    const { dtS } = receiver;
    if (tracking) this.trackingS += dtS;
    this.flowKg += loop.flowKgS * dtS;
    this.recordFaceC = Math.max(this.recordFaceC, receiver.faceC);
    this.recordCellC = Math.max(this.recordCellC, receiver.hottestC);
    if (loop.flowKgS > 0) {
      this.recordOutletC = Math.max(this.recordOutletC, receiver.outletC);
      this.pumpSeconds += dtS;
    }
    if (Math.min(loop.toReceiver.nowC, loop.toTank.nowC) < 0) this.pipeFreezeSeconds += dtS;
  }

  endRecord(
    record: number,
    intervalS: number,
    weather: WeatherYear,
    sunElevationDeg: number,
    tank: Tank,
    hourly: HourlyColumns,
  ): void {
    const { states, tankLayersC } = hourly;
    states.dniWm2[record] = weather.dniWm2[record]!;
    states.dryBulbC[record] = weather.dryBulbC[record]!;
    states.windMs[record] = weather.windMs[record]!;
    states.sunElevationDeg[record] = sunElevationDeg;
    states.trackingShare[record] = this.trackingS / intervalS;
    states.flowKgS[record] = this.flowKg / intervalS;
    states.faceC[record] = this.recordFaceC;
    states.cellC[record] = this.recordCellC;
    states.outletC[record] = this.recordOutletC;
    states.tankTopC[record] = tank.topC;
    states.tankBottomC[record] = tank.bottomC;
    tank.temperaturesC(this.layersC);
    for (let layer = 0; layer < this.layersC.length; layer++)
      tankLayersC[layer]![record] = this.layersC[layer]!;

    this.faceMaxC = Math.max(this.faceMaxC, this.recordFaceC);
    this.cellMaxC = Math.max(this.cellMaxC, this.recordCellC);
    this.outletMaxC = Math.max(this.outletMaxC, this.recordOutletC);
    this.tankTopMaxC = Math.max(this.tankTopMaxC, tank.topC);
  }
}
