import { type Typical, typicalOrigin } from './Typical.ts';

/** X/R of networks by their build: common practice, from memory. */
export const networkBuilds = {
  substation: { words: 'near a transformer substation, medium voltage', xOverR: 15, low: 10, high: 25 },
  medium: { words: 'medium-voltage lines and cables', xOverR: 10, low: 5, high: 15 },
  transformer: { words: 'low voltage, at the transformer', xOverR: 5, low: 3, high: 8 },
  feeder: { words: 'low voltage, at the end of a cable', xOverR: 1, low: 0.3, high: 2 },
} as const satisfies Readonly<Record<string, { words: string; xOverR: number; low: number; high: number }>>;

export type NetworkBuild = keyof typeof networkBuilds;

/** X/R of a supply by the network it stands in. The fault level is never guessed: the network operator knows it. */
export function typicalSupply(build: NetworkBuild): Typical<{ xOverR: number }> {
  const { words, xOverR, low, high } = networkBuilds[build];
  const source = `common practice, ${words}, found between ${low} and ${high} (from memory)`;
  return {
    ok: true,
    values: { xOverR },
    origins: { xOverR: typicalOrigin(source) },
    source: `X/R: ${source}. The fault level is to be asked of the network operator.`,
  };
}
