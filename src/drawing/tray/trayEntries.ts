import type { TrayKind } from '../gestures/TrayKind.ts';

export interface TrayEntry {
  kinds: readonly [TrayKind, ...TrayKind[]];
  /** Under the symbol. */
  name: string;
  /** The part's model in one line. */
  model: string;
}

/** The tray from top to bottom. R-L-C is one entry that opens into its two places. */
export const trayEntries: readonly TrayEntry[] = [
  {
    kinds: ['supply'],
    name: 'supply',
    model: '|Z| = U² / S_k″, R and X from X/R; EMF and background behind it',
  },
  { kinds: ['generator'], name: 'generator', model: '|Z| = x″d · U² / S_r, EMF behind it' },
  {
    kinds: ['transformer'],
    name: 'transformer',
    model: '|Z| = u_k · U² / S_r, R from the load loss, shift by vector group',
  },
  { kinds: ['cable'], name: 'cable', model: 'exact π circuit: Z_c · sinh γl, tanh(γl/2) / Z_c at each end' },
  { kinds: ['reactor'], name: 'reactor', model: 'Z(h) = R(h) + j·h·ωL in series' },
  {
    kinds: ['coupler'],
    name: 'coupler',
    model: 'Z = R + j·h·X of a closed bus tie; open when out of service',
  },
  {
    kinds: ['motor'],
    name: 'motor',
    model: 'constant power at the fundamental; R·√h + j·h·X of the locked rotor at harmonics',
  },
  {
    kinds: ['converter'],
    name: 'drive',
    model: 'I_h = percent · I_1 at angle + h·φ, a current source at every order',
  },
  { kinds: ['load'], name: 'load', model: 'P + jQ at the fundamental; P/U² beside Q/(h·U²) at harmonics' },
  { kinds: ['bank'], name: 'bank', model: 'Z(h) = R + j·(h·p·X_C − X_C/h), X_C = U² / Q over the steps on' },
  {
    kinds: ['filter'],
    name: 'filter',
    model: 'L and C tuned to n with quality q: single-tuned, high-pass or C-type',
  },
  {
    kinds: ['branch', 'shunt'],
    name: 'R-L-C',
    model: 'free R, L, C in series or parallel: between busbars, or to neutral',
  },
  { kinds: ['bus'], name: 'busbar', model: 'a node of its own voltage, U_n line to line' },
];
