import { originOf } from '../edits/origins.ts';
import { elementsOfKind } from '../lookup.ts';
import { fullNameOf } from '../names.ts';
import type { Generator, Study, Supply } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { type Said, type State, saidOfPart, setFields } from './Said.ts';

/** What every answer rests on and a reviewer asks for first: fault levels and x″d, with their source. */
export function sourceFindings(study: Study): Said[] {
  const state = { base: study, here: study, caseId: null };
  return [
    ...elementsOfKind(study, 'supply').flatMap((supply) => supplyFindings(state, supply)),
    ...elementsOfKind(study, 'generator').flatMap((generator) => reactance(study, generator)),
  ];
}

function supplyFindings(state: State, supply: Supply): Said[] {
  return [
    ...minimumFaultLevel(state, supply),
    ...faultLevelSource(state.base, supply),
    ...((supply.background ?? []).length > 0 ? [] : [noBackground(supply)]),
  ];
}

function minimumFaultLevel(state: State, supply: Supply): Said[] {
  const { shortCircuitMVA: most, shortCircuitMVAMin: least } = supply;
  if (least === undefined) {
    return [
      saidOfPart(supply, 'shortCircuitMVAMin', {
        code: 'fault-level-min',
        severity: 'warning',
        text: `the minimum fault level is missing beside the maximum of ${formatQuantity(most, 'MVA')}; every resonance moves with it`,
        mend: 'ask the network operator for both, with their date',
      }),
    ];
  }
  if (least <= most) return [];
  const words = `exchange the fault levels of ${fullNameOf(supply)}`;
  return [
    saidOfPart(supply, 'shortCircuitMVAMin', {
      code: 'fault-level-order',
      severity: 'error',
      text: `the minimum fault level ${formatQuantity(least, 'MVA')} lies above the maximum ${formatQuantity(most, 'MVA')}; allowed is a minimum up to the maximum`,
      mend: words,
      repair: setFields(state, supply.id, { shortCircuitMVA: least, shortCircuitMVAMin: most }, words),
    }),
  ];
}

function faultLevelSource(study: Study, supply: Supply): Said[] {
  const origin = originOf(study, supply, 'shortCircuitMVA')?.origin;
  if (origin === 'measured' || origin === 'nameplate') return [];
  return [
    saidOfPart(supply, 'shortCircuitMVA', {
      code: 'fault-level-source',
      severity: 'note',
      text: `the fault level of ${formatQuantity(supply.shortCircuitMVA, 'MVA')} ${origin ? `is ${origin}` : 'has no source'}; a reviewer asks who stated it and when`,
      mend: 'note its origin beside the value: the network operator, the letter, the date',
    }),
  ];
}

function noBackground(supply: Supply): Said {
  return saidOfPart(supply, 'background', {
    code: 'no-background',
    severity: 'note',
    text: 'no background distortion is entered; the supply’s own harmonics load a bank as well',
    mend: 'measure the voltage at the point of common coupling with the bank out, or take the planning levels',
  });
}

function reactance(study: Study, generator: Generator): Said[] {
  const origin = originOf(study, generator, 'xdSubtransientPercent')?.origin;
  if (origin !== 'typical' && origin !== 'assumed') return [];
  return [
    saidOfPart(generator, 'xdSubtransientPercent', {
      code: 'generator-reactance',
      severity: 'note',
      text: `x″d of ${formatQuantity(generator.xdSubtransientPercent, '%')} is ${origin}; on the generator it alone decides where the site resonates`,
      mend: 'take x″d (saturated) from the machine’s data sheet',
    }),
  ];
}
