/** Which kinds of operating state are made from the study's cases. Each family multiplies the others. */
export interface StateFamilies {
  /** Ids of the cases to start from; left out, all of them. */
  cases?: readonly string[];
  /** Every distinct kvar every bank can switch. */
  steps: boolean;
  /** Supplies at their smallest fault level, where one is entered. */
  weakSupply: boolean;
  /** Every coupler open and closed. */
  couplers: boolean;
  /** Each transformer out by itself, where its busbars stay fed. */
  transformerOut: boolean;
  /** On the generators, supplies off. */
  generator: boolean;
  /** Loads, motors and drives at this per cent of their power; null leaves the family out. */
  lightLoadPercent: number | null;
}

/** Step combinations of every case; weak supply is an axis of the tolerance space already. */
export const defaultFamilies: StateFamilies = {
  steps: true,
  weakSupply: false,
  couplers: false,
  transformerOut: false,
  generator: false,
  lightLoadPercent: null,
};

/** Above this many the states are counted, not made: the families are then narrowed by hand. */
export const MOST_STATES = 2000;
