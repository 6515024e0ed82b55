/** Molar gas constant R, J mol⁻¹ K⁻¹ (SI 2019, exact product of fixed constants). */
export const GAS_CONSTANT = 8.31446261815324;

/** kB, J/K, and h, J s (SI 2019, exact). */
export const BOLTZMANN_CONSTANT = 1.380649e-23;
export const PLANCK_CONSTANT = 6.62607015e-34;

/** Two-sided probability left outside every interval that the engine reports. */
export const INTERVAL_ALPHA = 0.05;

/** Version of the engine; it changes whenever a reported number may change. */
export const ENGINE_VERSION = '0.2.0';
