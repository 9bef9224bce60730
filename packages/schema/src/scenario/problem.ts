/** What no single field can see: the field to change and why. */
export interface CrossFieldProblem {
  /** "catch.receiver.faceSideM" */
  readonly path: string;
  readonly message: string;
}

/** Whether a square opening of the given side can stand in front of a dish. */
export function fitsBeforeDish(sideM: number, apertureDiameterM: number): boolean {
  return sideM * Math.SQRT2 < apertureDiameterM;
}
