/** Refused input to a public function: names the quantity, its value and what is allowed. */
export class DomainError extends RangeError {
  override readonly name = 'DomainError';

  constructor(
    readonly quantity: string,
    readonly value: unknown,
    readonly allowed: string,
  ) {
    super(`${quantity} is ${String(value)}; allowed: ${allowed}`);
  }
}

/** A run that cannot go on: names the weather record, the part of the machine and what happened there. */
export class RunError extends Error {
  override readonly name = 'RunError';

  constructor(
    readonly part: string,
    readonly recordIndex: number,
    readonly detail: string,
  ) {
    super(`${part}, weather record ${recordIndex + 1}: ${detail}`);
  }
}

/** Throws a DomainError unless `low <= value <= high` (NaN and infinities are refused). */
export function requireRange(quantity: string, value: number, low: number, high: number): void {
  if (!(value >= low && value <= high)) throw new DomainError(quantity, value, `${low} to ${high}`);
}
