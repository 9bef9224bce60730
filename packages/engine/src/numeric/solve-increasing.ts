/** A strictly increasing function of one number. `residual` may write side results for its last argument. */
export interface IncreasingProblem {
  residual(x: number): number;
}

/** The iteration ran out, or the root does not lie between the bounds. */
export class ConvergenceError extends Error {
  override readonly name = 'ConvergenceError';
}

/** Far above what is seen (3 to 8), so that a failure means a broken problem and not a slow one. */
const MAX_ITERATIONS = 200;

/**
 * Root of a strictly increasing function by the secant method inside a shrinking bracket: it cannot leave
 * the bracket, and bisects where the secant does not at least halve the residual in two goes.
 *
 * The last call of `residual` is always made with the number returned, so side results belong to it.
 *
 * @param problem - the function; finite between the bounds
 * @param guess - first try, moved between the bounds
 * @param slope - estimate of the derivative at the guess [> 0]
 * @param low - bound where the function is negative
 * @param high - bound where the function is positive
 * @param tolerance - largest accepted size of the residual, in the function's unit [> 0]
 * @returns the root; where round-off keeps the residual above the tolerance, the closest number to it
 * @throws ConvergenceError when no root lies between the bounds, the function is not a number, or the bounded
 *   number of iterations is used up
 *
 * Source: safeguarded secant iteration, as in Dekker 1969 without the inverse interpolation.
 */
export function solveIncreasing(
  problem: IncreasingProblem,
  guess: number,
  slope: number,
  low: number,
  high: number,
  tolerance: number,
): number {
  let left = low;
  let right = high;
  let x = Math.min(Math.max(guess, low), high);
  let value = problem.residual(x);
  let secant = slope;
  let halvedAgo = 0;
  let reference = Math.abs(value);

  for (let iteration = 0; iteration < MAX_ITERATIONS; iteration++) {
    if (Math.abs(value) <= tolerance) return x;
    if (Number.isNaN(value)) throw new ConvergenceError(`the balance is not a number at ${x}`);
    if (value < 0) left = x;
    else right = x;

    let next = x - value / secant;
    if (halvedAgo >= 2 || !(next > left && next < right)) {
      next = left + (right - left) / 2;
      halvedAgo = 0;
      reference = Math.abs(value);
    }
    if (next === x || next <= left || next >= right)
      return atClosest(problem, x, low, high, value, tolerance);

    const nextValue = problem.residual(next);
    const nextSecant = (nextValue - value) / (next - x);
    if (nextSecant > 0 && Number.isFinite(nextSecant)) secant = nextSecant;
    if (Math.abs(nextValue) <= reference / 2) {
      reference = Math.abs(nextValue);
      halvedAgo = 0;
    } else {
      halvedAgo++;
    }
    x = next;
    value = nextValue;
  }
  throw new ConvergenceError(`no balance within ${MAX_ITERATIONS} iterations; ${value} is left at ${x}`);
}

/** The bracket cannot be split any further: fine in the middle, but at a bound the root lies outside. */
function atClosest(
  problem: IncreasingProblem,
  x: number,
  low: number,
  high: number,
  value: number,
  tolerance: number,
): number {
  const nearLow = x - low <= Number.EPSILON * Math.max(1, Math.abs(low)) * 4;
  const nearHigh = high - x <= Number.EPSILON * Math.max(1, Math.abs(high)) * 4;
  if ((nearLow && value > tolerance) || (nearHigh && value < -tolerance)) {
    throw new ConvergenceError(`no balance between ${low} and ${high}; ${value} is left at ${x}`);
  }
  problem.residual(x);
  return x;
}
