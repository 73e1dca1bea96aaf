/** Step in N·m that a torque which was worked out is shown to: no wrench can be set finer. */
export const torqueStep = (nm: number): number => (nm < 2 ? 0.01 : nm < 100 ? 0.1 : 1);
