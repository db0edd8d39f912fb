import type { StateFamilies } from '../../sizing/index.ts';
import { elementsOfKind, isOn, type Study } from '../../study/index.ts';

/** One family of states as a line to tick. */
export interface FamilyRow {
  key: Exclude<keyof StateFamilies, 'cases' | 'lightLoadPercent'>;
  words: string;
  /** Why the site has no such states; null where it has. */
  missing: string | null;
}

/** The families that are simply in or out; light load has a field of its own. */
export function familyRows(study: Study): FamilyRow[] {
  const banks = elementsOfKind(study, 'bank');
  const supplies = elementsOfKind(study, 'supply');
  return [
    {
      key: 'steps',
      words: 'every step combination of every bank',
      missing: banks.length === 0 ? 'no bank is drawn' : null,
    },
    {
      key: 'weakSupply',
      words: 'supply at its smallest fault level',
      missing: supplies.some(({ shortCircuitMVAMin }) => shortCircuitMVAMin !== undefined)
        ? null
        : 'no smallest fault level is entered',
    },
    {
      key: 'couplers',
      words: 'couplers open and closed',
      missing: elementsOfKind(study, 'coupler').length === 0 ? 'no coupler is drawn' : null,
    },
    {
      key: 'transformerOut',
      words: 'one transformer out, where its busbars stay fed',
      missing:
        elementsOfKind(study, 'transformer').filter(isOn).length < 2 ? 'fewer than two transformers' : null,
    },
    {
      key: 'generator',
      words: 'on the generator, supply off',
      missing: elementsOfKind(study, 'generator').length === 0 ? 'no generator is drawn' : null,
    },
  ];
}
