/** What may stand off its rated value. */
export type DimensionKind =
  | 'capacitance'
  | 'inductance'
  | 'transformer-impedance'
  | 'fault-level'
  | 'supply-voltage'
  | 'frequency'
  | 'background'
  | 'motors';

/**
 * One axis of the tolerance space: a factor on the rated value of one part (or of the site), from `low` to
 * `high`, 1 at the rated point. Motors are a switch: 0 out of service, 1 running, nothing between.
 */
export interface Dimension {
  kind: DimensionKind;
  /** The part it belongs to; absent for the frequency and the motors together. */
  part?: string;
  /** "capacitance of Bank C1": reads on with "+7 %". */
  words: string;
  low: number;
  high: number;
}

/** A tolerance point: one factor per dimension, in their order. */
export type Point = Float64Array;

/** Whether nothing lies between the ends. */
export const isSwitch = ({ kind }: Dimension): boolean => kind === 'motors';

export const ratedPoint = (dimensions: readonly Dimension[]): Point =>
  new Float64Array(dimensions.length).fill(1);
