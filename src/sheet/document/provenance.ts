import type { Provenance, Source } from '../../checks/index.ts';

/** Raised figures that tell how well a limit is known. They are explained wherever they are used. */
const RAISED: Record<Provenance, string> = { published: '¹', 'second-hand': '²', memory: '³', practice: '⁴' };

const WORDS: Record<Provenance, string> = {
  published: 'read in the source',
  'second-hand': 'quoted second-hand',
  memory: 'from memory',
  practice: 'common practice, no published source',
};

/** "IEC 60831-1:2014, cl. 20 ²". */
export function sourceWithMark(source: Source): string {
  const edition = source.edition ? `:${source.edition}` : '';
  const clause = source.clause ? `, ${source.clause}` : '';
  return `${source.document}${edition}${clause} ${RAISED[source.provenance]}`;
}

export const provenanceWords = (provenance: Provenance): string =>
  `${RAISED[provenance]} ${WORDS[provenance]}`;

/** One line explaining the figures that occur; empty where none does. */
export function provenanceNote(sources: readonly Source[]): string[] {
  const order: Provenance[] = ['published', 'second-hand', 'memory', 'practice'];
  const present = order.filter((item) => sources.some(({ provenance }) => provenance === item));
  if (present.length === 0) return [];
  const unsure = present.filter((item) => item === 'second-hand' || item === 'memory');
  const figures = unsure.map((item) => RAISED[item]).join(' and ');
  const tail = figures === '' ? '' : `. Check ${figures} against the edition in force before approval`;
  return [`${present.map((item) => provenanceWords(item)).join('; ')}${tail}.`];
}
