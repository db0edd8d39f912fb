import { fieldOf } from '../fields/fieldsOf.ts';
import { busById, elementById } from '../lookup.ts';
import { fullNameOf, nameOf } from '../names.ts';
import type { FindingSubject, Study } from '../types.ts';
import { type Said, saidOfStudy } from './Said.ts';

/** Values that are typical for their kind and that nobody has compared with a nameplate yet. */
export function originFindings(study: Study): Said[] {
  const typical = Object.entries(study.origins ?? {}).flatMap(([path, { origin }]) => {
    const [list, ...rest] = path.split('.');
    const field = rest.pop() ?? '';
    const id = rest.join('.');
    if (origin !== 'typical' || (list !== 'elements' && list !== 'buses')) return [];
    const owner = list === 'elements' ? elementById(study, id) : busById(study, id);
    return owner && fieldOf('kind' in owner ? owner.kind : 'bus', field) ? [{ owner, field }] : [];
  });
  const [first] = typical;
  if (!first) return [];
  const names = [
    ...new Set(typical.map(({ owner }) => ('kind' in owner ? fullNameOf(owner) : nameOf(owner)))),
  ];
  const { length } = typical;
  const subject: FindingSubject = { kind: 'kind' in first.owner ? 'element' : 'bus', id: first.owner.id };
  return [
    {
      ...saidOfStudy(['origins'], {
        code: 'typical-values',
        severity: 'note',
        value: length,
        text: `${length} ${length === 1 ? 'value is' : 'values are'} typical and not yet confirmed: ${listed(names)}`,
        mend: 'compare each with the nameplate, and set its origin beside the value',
      }),
      subject,
      field: first.field,
    },
  ];
}

const namedAtMost = 4;

function listed(names: readonly string[]): string {
  const more = names.length - namedAtMost;
  return `${names.slice(0, namedAtMost).join(', ')}${more > 0 ? ` and ${more} more parts` : ''}`;
}
