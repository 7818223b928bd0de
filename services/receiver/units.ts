/** Plain names for SI numbers without prefix. A number that is not SI says so in its own name. */
export type Hertz = number;
export type Henry = number;
export type Farad = number;
export type Ohm = number;
export type Metre = number;
export type Watt = number;
export type Kelvin = number;
export type Volt = number;
export type Ampere = number;

/** Metre a second. */
export const LIGHT_SPEED = 299792458;
/** Farad a metre. */
export const EPSILON_0 = 8.8541878128e-12;
/** Henry a metre, 4e-7 pi. */
export const MU_0 = 1.2566370614359173e-6;
/** Boltzmann's constant over the elementary charge, volt a kelvin. */
export const THERMAL_VOLT = 1.380649e-23 / 1.602176634e-19;
export const TWO_PI = 6.283185307179586;
