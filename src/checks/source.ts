import type { Provenance, Source } from './types.ts';

const words: Record<Provenance, string> = {
  published: 'read in the source',
  'second-hand': 'second-hand',
  memory: 'from memory, check before use',
  practice: 'common practice',
};

/** A rule of the trade without a document of its own. */
export const commonPractice: Source = { document: 'common practice', provenance: 'practice' };

/** Stands where a study's choice names no set, so no document can be cited. */
export const noLimitSet: Source = { document: 'no limit set', provenance: 'practice' };

/** "IEC 60831-1:2014, maximum permissible current (from memory, check before use)". */
export function sourceText(source: Source): string {
  if (source.document === noLimitSet.document || source.document === commonPractice.document)
    return source.document;
  const edition = source.edition ? `:${source.edition}` : '';
  const clause = source.clause ? `, ${source.clause}` : '';
  return `${source.document}${edition}${clause} (${words[source.provenance]})`;
}
