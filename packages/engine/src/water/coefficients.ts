/**
 * Polynomials of liquid water, x = (t − 100 °C)/100 K. Made by validation/water/write-coefficients.ts from
 * IAPWS-IF97 region 1, IAPWS R12-08 and R15-11 at 1 MPa, or saturation where that is higher; a test remakes them.
 */

/** Lowest and highest temperature of the fits [°C]. */
export const FIT_LOW_C = 0;
export const FIT_HIGH_C = 200;

/** Heat capacity [J/(kg·K)] in powers of x. */
export const HEAT_CAPACITY = [
  4214.385310165099, 126.45834346130209, 114.08142738925949, 10.429396013365931, -3.549821072922896,
  39.54945332185707, 29.01505918125258, -36.6576434941162,
] as const;

/** Mean heat capacity from 0 °C to t [J/(kg·K)] in powers of x: the exact integral of HEAT_CAPACITY, over t. */
export const MEAN_HEAT_CAPACITY = [
  4188.001606017195, 26.383704147904275, 36.84546758274677, 1.181674880339727, 1.4256741230017558,
  -2.135638337586335, 8.72721389122918, -4.582205436764525,
] as const;

/** Temperature [°C] in powers of y = 2h/h(200 °C) − 1, within 1e-4 K: where the exact inversion starts. */
export const TEMPERATURE_START = [
  101.60947204055732, 100.93470006473144, -1.5718141059986843, -0.8869190474755416, 0.002114685661646576,
  0.04482133214535959, -0.15791918261901272, -0.09257793227138537, 0.11819783829850412,
] as const;

/** Density [kg/m³] in powers of x. */
export const DENSITY = [
  958.7583210379156, -71.82123058980962, -22.57823772906992, 2.1238815836396348, -3.647994633261684,
  1.8528031466815567,
] as const;

/** Fluidity, 1/viscosity [1/(Pa·s)], in powers of x. */
export const FLUIDITY = [
  3547.8054862976132, 3720.766358185788, 402.27024485883044, -317.01658258521803, 44.48696759481648,
  32.17911778475733,
] as const;

/** Thermal conductivity [W/(m·K)] in powers of x. */
export const CONDUCTIVITY = [
  0.6776145118321704, 0.03779778550337743, -0.06337455976039914, 0.008072512608185645, -0.006548576122353969,
  0.00510297956173226,
] as const;
