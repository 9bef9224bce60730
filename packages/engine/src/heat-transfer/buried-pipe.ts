import { DomainError, requireRange } from '../errors.js';
import type { PipeCrossSection } from './pipe-insulation.js';

/** An insulated pipe in the ground, in cross-section. */
export interface BuriedPipeCrossSection extends Omit<PipeCrossSection, 'outsideFilmWm2K'> {
  /** From the surface of the ground to the pipe's axis [m, more than its outer radius]. */
  readonly depthM: number;
  /** Conductivity of the ground [W/(m·K), > 0]. */
  readonly soilConductivityWmK: number;
}

/**
 * Conductance from the water in a buried, insulated pipe to the undisturbed ground at its depth, for each metre.
 *
 * Insulation and ground in series: 1/(ln(r_out/r_in)/(2πk) + arcosh(z/r_out)/(2πk_soil)). The second term is the
 * shape factor of a cylinder under a plane of steady temperature; conduction is linear, so it holds against the
 * undisturbed temperature at the axis while that changes slowly. The warmth that the ground around the pipe
 * keeps, and what two pipes in one trench give each other, are left out.
 *
 * @param pipe its cross-section **[ranges: see {@link BuriedPipeCrossSection}]**
 * @returns **[W/(m·K)]**
 * @throws DomainError for a size out of its range, or a pipe that looks out of the ground
 *
 * Source: line source and its image, Carslaw & Jaeger 1959, Conduction of Heat in Solids; the shape factor
 * 2πL/arcosh(2z/D) in Incropera et al., Fundamentals of Heat and Mass Transfer, Table 4.1.
 * @example
 * buriedPipeConductanceWmK({boreM: 0.02, wallM: 0.001, insulationM: 0.03, insulationConductivityWmK: 0.04, depthM: 0.8, soilConductivityWmK: 1.5}) // 0.1778
 */
export function buriedPipeConductanceWmK(pipe: BuriedPipeCrossSection): number {
  requireRange('pipe bore [m]', pipe.boreM, 1e-3, 2);
  requireRange('pipe wall [m]', pipe.wallM, 0, 0.1);
  requireRange('pipe insulation [m]', pipe.insulationM, 0, 1);
  requireRange('insulation conductivity [W/(m·K)]', pipe.insulationConductivityWmK, 1e-3, 10);
  requireRange('soil conductivity [W/(m·K)]', pipe.soilConductivityWmK, 1e-2, 10);
  requireRange('pipe depth [m]', pipe.depthM, 0, 100);
  const innerM = pipe.boreM / 2 + pipe.wallM;
  const outerM = innerM + pipe.insulationM;
  if (pipe.depthM <= outerM) {
    throw new DomainError('pipe depth [m]', pipe.depthM, `more than the outer radius of ${outerM}`);
  }
  const insulation = Math.log(outerM / innerM) / pipe.insulationConductivityWmK;
  const ground = Math.acosh(pipe.depthM / outerM) / pipe.soilConductivityWmK;
  return (2 * Math.PI) / (insulation + ground);
}
