import { requireRange } from '../errors.js';

/** An insulated pipe in cross-section. */
export interface PipeCrossSection {
  /** Inner diameter of the pipe [m, > 0]. */
  readonly boreM: number;
  /** Thickness of its wall [m, ≥ 0]. */
  readonly wallM: number;
  /** Thickness of the insulation [m, ≥ 0]. */
  readonly insulationM: number;
  /** Conductivity of the insulation [W/(m·K), > 0]. */
  readonly insulationConductivityWmK: number;
  /** Heat transfer from the outer surface to the air, radiation included [W/(m²·K), > 0]. */
  readonly outsideFilmWm2K: number;
}

/**
 * Conductance from the water in an insulated pipe to the air, for each metre of pipe.
 *
 * Radial conduction through the insulation and the film outside in series:
 * 1/(ln(r_out/r_in)/(2πk) + 1/(2π r_out h)). The metal wall and the film inside are left out: they add under
 * 1 % to the resistance of any insulated pipe. A thin layer on a thin pipe can lose more than none (below the
 * critical radius k/h); the formula shows it.
 *
 * @param pipe its cross-section **[ranges: see {@link PipeCrossSection}]**
 * @returns **[W/(m·K)]**
 * @throws DomainError for a size out of its range
 *
 * Source: Fourier's law in cylindrical coordinates, e.g. Incropera et al., Fundamentals of Heat and Mass
 * Transfer, ch. 3.
 * @example
 * pipeConductanceWmK({boreM: 0.02, wallM: 0.001, insulationM: 0.05, insulationConductivityWmK: 0.035, outsideFilmWm2K: 15}) // 0.1256
 */
export function pipeConductanceWmK(pipe: PipeCrossSection): number {
  requireRange('pipe bore [m]', pipe.boreM, 1e-3, 2);
  requireRange('pipe wall [m]', pipe.wallM, 0, 0.1);
  requireRange('pipe insulation [m]', pipe.insulationM, 0, 1);
  requireRange('insulation conductivity [W/(m·K)]', pipe.insulationConductivityWmK, 1e-3, 10);
  requireRange('outside film [W/(m²·K)]', pipe.outsideFilmWm2K, 1e-3, 1e4);
  const innerM = pipe.boreM / 2 + pipe.wallM;
  const outerM = innerM + pipe.insulationM;
  const insulation = Math.log(outerM / innerM) / (2 * Math.PI * pipe.insulationConductivityWmK);
  const film = 1 / (2 * Math.PI * outerM * pipe.outsideFilmWm2K);
  return 1 / (insulation + film);
}
