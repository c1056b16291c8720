/** Boltzmann constant, J/K. Exact, SI 2019. */
export const BOLTZMANN = 1.380649e-23;
/** Elementary charge, C. Exact, SI 2019. */
export const ELEMENTARY_CHARGE = 1.602176634e-19;
/** 0 degC in K. Exact by definition of the Celsius scale. */
export const ZERO_CELSIUS = 273.15;
/** Irradiance of the standard test conditions, W/m2 (IEC 61215, STC). */
export const STANDARD_IRRADIANCE = 1000;
/** Cell temperature of the standard test conditions, degC (IEC 61215, STC). */
export const STANDARD_TEMPERATURE = 25;
/** Irradiances up to this are darkness, W/m2: a millionth of a millionth of what any instrument resolves. */
export const DARK_IRRADIANCE = 1e-9;
