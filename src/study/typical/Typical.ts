import type { DataOrigin } from '../types.ts';

/** Typical values of a part's fields, with the source of each, or why there are none. */
export type Typical<Values extends object> =
  | {
      ok: true;
      /** An edit-ready patch of the part, in the fields' own units. */
      values: Values;
      /** Origin 'typical' of every value by its field, the source as its note; choices need none. */
      origins: Readonly<Record<string, DataOrigin>> & { readonly [K in keyof Values]: DataOrigin };
      /** All sources in one sentence. */
      source: string;
    }
  | {
      ok: false;
      /** One sentence with the permitted range. */
      error: string;
    };

export function typicalOrigin(note: string): DataOrigin {
  return { origin: 'typical', note };
}
