/** S/m, annealed copper at 20 °C: 100 % IACS (IEC 60028). Some handbooks compute with 5.813e7, which is 0.1 % less loss. */
const CONDUCTIVITY = 5.8e7

/** 1/K at 20 °C, from memory: resistivity over temperature as 1/(234.5 + 20) = 0.00393. Other reference temperatures have others. */
const PER_KELVIN = 0.00393
/** °C. */
export const COPPER_STATED_AT = 20

/**
 * Conductivity of copper: resistivity grows by 0.393 % of its value at 20 °C a kelvin (coefficient from memory). Linear,
 * which is good to 0.1 % from −60 to 200 °C.
 * @param celsius °C
 * @returns S/m
 */
export function copperConductivity(celsius: number): number {
  return CONDUCTIVITY / (1 + PER_KELVIN * (celsius - COPPER_STATED_AT))
}

/** °C at which copper conducts so many S/m: the other way round. */
export function copperTemperature(conductivity: number): number {
  return COPPER_STATED_AT + (CONDUCTIVITY / conductivity - 1) / PER_KELVIN
}
