import { requirePositive } from '../arguments/require-positive';

const MM2_PER_M2 = 1e6;

/**
 * Thermal diffusivity of a material.          D = k / (rho c_p)
 *
 * @param conductivityWPerMK     heat conductivity k, W/(m K), finite, > 0
 * @param densityKgPerM3         density rho, kg/m^3, finite, > 0
 * @param heatCapacityJPerKgK    specific heat capacity c_p, J/(kg K), finite, > 0
 * @returns diffusivity, mm^2/s
 * @throws RangeError naming the argument and its value, if out of range
 * Valid at the temperature of the constants.
 * Source: Carslaw, Jaeger, Conduction of Heat in Solids (1959); docs/science/thermal.md
 */
export function thermalDiffusivity(conductivityWPerMK: number, densityKgPerM3: number, heatCapacityJPerKgK: number): number {
  requirePositive({ conductivityWPerMK, densityKgPerM3, heatCapacityJPerKgK });
  return (conductivityWPerMK / (densityKgPerM3 * heatCapacityJPerKgK)) * MM2_PER_M2;
}
