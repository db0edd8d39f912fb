/** Cross-section in mm², then the highest d.c. resistance at 20 °C in Ω/km. */
export type ConductorRow = readonly [mm2: number, ohmPerKm: number];

/** IEC 60228, Table 2: class 2 stranded conductors, plain copper and aluminium; second-hand, three tables agree. */
export const conductorSource = 'IEC 60228, Table 2, class 2 (second-hand)';

export const copper: readonly ConductorRow[] = [
  [1.5, 12.1],
  [2.5, 7.41],
  [4, 4.61],
  [6, 3.08],
  [10, 1.83],
  [16, 1.15],
  [25, 0.727],
  [35, 0.524],
  [50, 0.387],
  [70, 0.268],
  [95, 0.193],
  [120, 0.153],
  [150, 0.124],
  [185, 0.0991],
  [240, 0.0754],
  [300, 0.0601],
  [400, 0.047],
  [500, 0.0366],
  [630, 0.0283],
];

export const aluminium: readonly ConductorRow[] = [
  [10, 3.08],
  [16, 1.91],
  [25, 1.2],
  [35, 0.868],
  [50, 0.641],
  [70, 0.443],
  [95, 0.32],
  [120, 0.253],
  [150, 0.206],
  [185, 0.164],
  [240, 0.125],
  [300, 0.1],
  [400, 0.0778],
  [500, 0.0605],
  [630, 0.0469],
];
