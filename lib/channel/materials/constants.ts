/** m/s, exact (SI). */
export const SPEED_OF_LIGHT = 299_792_458

/** H/m, as before 2019; the measured value differs by 2e-10. */
export const MU0 = 4e-7 * Math.PI

/** Ω, impedance of free space. */
export const ETA0 = MU0 * SPEED_OF_LIGHT
