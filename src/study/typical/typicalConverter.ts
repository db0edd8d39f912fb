import { builtInSpectrum } from '../spectra/builtIn.ts';
import { type Typical, typicalOrigin } from './Typical.ts';

export interface ConverterValues {
  spectrum: string;
  powerFactor?: number;
  wires?: 3 | 4;
}

interface ConverterType {
  words: string;
  /** Id of a built-in spectrum; absent where no table of its orders is known. */
  spectrum?: string;
  powerFactor?: number;
  wires?: 3 | 4;
}

const diodeBridge = { powerFactor: 0.95, wires: 3 } as const;

/** Converters by their build, with the spectrum that stands for them. */
export const converterTypes = {
  'choke-3': { words: 'drive, diode bridge, 3 % choke', spectrum: 'drive-reactance-3', ...diodeBridge },
  'choke-5': { words: 'drive, diode bridge, 5 % choke', spectrum: 'drive-reactance-5', ...diodeBridge },
  'no-choke': {
    words: 'drive, diode bridge, no choke (1 % in all)',
    spectrum: 'drive-reactance-1',
    ...diodeBridge,
  },
  thyristor: { words: 'thyristor bridge, smooth d.c. current', spectrum: 'six-pulse-typical', wires: 3 },
  'twelve-pulse': { words: 'twelve-pulse rectifier', spectrum: 'twelve-pulse-ideal', wires: 3 },
  electronics: { words: 'single-phase electronics', spectrum: 'single-phase-electronics', wires: 4 },
  active: { words: 'active front end' },
} as const satisfies Readonly<Record<string, ConverterType>>;

export type ConverterBuild = keyof typeof converterTypes;

const powerFactorSource = 'common practice, 0.95 to 1 for diode bridges';

/**
 * Spectrum by the converter's build, with the source of its rows; cos φ1 where the build decides it (a
 * thyristor bridge's follows its firing angle). Refuses builds nobody has published orders of.
 */
export function typicalConverter(build: ConverterBuild): Typical<ConverterValues> {
  const { words, spectrum: id, powerFactor, wires }: ConverterType = converterTypes[build];
  const spectrum = id === undefined ? undefined : builtInSpectrum(id);
  if (!spectrum)
    return {
      ok: false,
      error: `No table of the orders of an ${words} is known here; take its maker's or a measured spectrum. THD(I) is usually 3 to 5 % (from memory).`,
    };
  return {
    ok: true,
    values: {
      spectrum: spectrum.id,
      ...(powerFactor === undefined ? {} : { powerFactor }),
      ...(wires === undefined ? {} : { wires }),
    },
    origins: {
      spectrum: typicalOrigin(spectrum.origin),
      ...(powerFactor === undefined ? {} : { powerFactor: typicalOrigin(powerFactorSource) }),
    },
    source: `Spectrum: ${spectrum.origin}${spectrum.anglesKnown ? '' : '; angles unknown'}.${powerFactor === undefined ? '' : ` cos φ1: ${powerFactorSource}.`}`,
  };
}
