import { type Typical, typicalOrigin } from './Typical.ts';

/** IEEE Std 141-1993, typical subtransient reactances, second-hand. */
const source = 'IEEE Std 141-1993, typical values (second-hand)';

interface ReactanceRow {
  words: string;
  percent: number;
  low: number;
  high: number;
}

/** x″d in % of the machine's own rating: typical, and the range it is found in. */
export const generatorReactances = {
  'salient-12': { words: 'salient poles with dampers, up to 12 poles', percent: 16, low: 10, high: 24 },
  'salient-more': { words: 'salient poles with dampers, above 12 poles', percent: 21, low: 15, high: 30 },
  'round-2': { words: 'round rotor, 2 poles', percent: 12, low: 9, high: 18 },
  'round-4': { words: 'round rotor, 4 poles', percent: 15, low: 12, high: 22 },
} as const satisfies Readonly<Record<string, ReactanceRow>>;

export type GeneratorBuild = keyof typeof generatorReactances;

export interface GeneratorValues {
  xdSubtransientPercent: number;
}

/**
 * Subtransient reactance x″d in % by the machine's build. The range stands in the source words: measured
 * low-voltage sets of 130 to 140 kVA lay at 6.9 to 12 %, below it.
 */
export function typicalGenerator(build: GeneratorBuild): Typical<GeneratorValues> {
  const { words, percent, low, high } = generatorReactances[build];
  const note = `${source}, ${words}, found between ${low} and ${high} %`;
  return {
    ok: true,
    values: { xdSubtransientPercent: percent },
    origins: { xdSubtransientPercent: typicalOrigin(note) },
    source: `x″d: ${note}.`,
  };
}
