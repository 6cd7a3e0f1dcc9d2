/**
 * Factor on kd where substrate protects the enzyme: only the free enzyme is lost.
 *
 * Units    kg/m³, kg/m³; returns 0..1.
 * Source   free share of an enzyme that binds substrate with constant Kp: 1/(1 + S/Kp).
 */
export const protectedShare = (Kp: number, S: number): number => 1 / (1 + S / Kp)
