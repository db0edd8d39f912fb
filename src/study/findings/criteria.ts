import { updateBus } from '../edits/updates.ts';
import { elementsOfKind } from '../lookup.ts';
import { busName } from '../names.ts';
import type { Study } from '../types.ts';
import { type Said, saidOfBus, saidOfStudy } from './Said.ts';

/** Where the site is judged, and by what. */
export function criteriaFindings(study: Study): Said[] {
  return [...pointOfCommonCoupling(study), ...demandCurrent(study)];
}

function pointOfCommonCoupling(study: Study): Said[] {
  const supplied = new Set(elementsOfKind(study, 'supply').map(({ bus }) => bus));
  const marked = study.buses.filter((bus) => bus.pcc);
  const [only] = supplied;
  if (marked.length === 0) {
    const words = only === undefined ? '' : `mark ${busName(study, only)} as point of common coupling`;
    return [
      saidOfStudy(['buses'], {
        code: 'no-pcc',
        severity: 'warning',
        text: 'no busbar is marked as point of common coupling, where the network operator judges the site',
        mend: words || 'mark the busbar where the supply feeds the site',
        repair:
          only !== undefined && supplied.size === 1
            ? { words, scope: words, make: (current) => updateBus(current, only, { pcc: true }) }
            : undefined,
      }),
    ];
  }
  const last = marked.at(-1);
  if (!last || marked.length <= Math.max(1, supplied.size)) return [];
  return [
    saidOfBus(study, last, 'pcc', {
      code: 'several-pcc',
      severity: 'warning',
      text: `${marked.length} busbars are marked as point of common coupling (${marked.map(({ id }) => busName(study, id)).join(', ')}) with ${supplied.size || 'no'} fed by a supply; allowed is one for each feed of the network operator`,
      mend: 'take the mark off the busbars inside the site; their limits are the internal ones',
    }),
  ];
}

/** TDD and the row of the current limits need I_L as soon as something distorts the current. */
function demandCurrent(study: Study): Said[] {
  const distorts = study.elements.some(({ kind }) => kind === 'converter');
  if (!distorts || study.criteria?.demandCurrentA !== undefined) return [];
  return [
    saidOfStudy(['criteria', 'demandCurrentA'], {
      code: 'no-demand-current',
      severity: 'warning',
      text: 'the maximum demand current I_L at the point of common coupling is missing; TDD and the row of the current limits need it',
      mend: 'take it from the bills: the largest 15- or 30-minute demand of twelve months over √3·U',
    }),
  ];
}
