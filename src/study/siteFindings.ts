import { busById, isOn } from './lookup.ts';
import { busName, fullNameOf } from './names.ts';
import type { Bank, Finding, Study, StudyElement } from './types.ts';
import { formatQuantity } from './units/formatQuantity.ts';
import { findingOf, type PathStep, warningIssue } from './validate/issue.ts';

/**
 * What is missing or odd about a site that is being drawn, as warnings that say what mends them: busbars
 * without a source, capacitors rated for the wrong voltage, no point of common coupling, no demand current,
 * no minimum fault level. Nothing here refuses the study.
 */
export function siteFindings(study: Study): Finding[] {
  if (study.buses.length === 0) return [];
  return [
    ...unfedBuses(study),
    ...study.elements.flatMap((element, index) => partFindings(study, element, index)),
    ...criteriaFindings(study),
  ];
}

function say(code: string, path: readonly PathStep[], value: unknown, where: string, text: string): Finding {
  return findingOf(warningIssue(code, [], value, text), where, path);
}

function unfedBuses(study: Study): Finding[] {
  const sources = study.elements.filter(
    (element) => isOn(element) && (element.kind === 'supply' || element.kind === 'generator'),
  );
  if (sources.length === 0)
    return [
      say(
        'no-source',
        ['elements'],
        undefined,
        '',
        'nothing feeds the site; add a supply or put one in service',
      ),
    ];
  const fed = new Set(sources.flatMap((element) => ('bus' in element ? [element.bus] : [])));
  for (let size = -1; size !== fed.size; ) {
    size = fed.size;
    for (const element of study.elements) {
      if (!('from' in element) || !isOn(element)) continue;
      if (fed.has(element.from)) fed.add(element.to);
      else if (fed.has(element.to)) fed.add(element.from);
    }
  }
  return study.buses.flatMap((bus, index) =>
    fed.has(bus.id)
      ? []
      : [
          say(
            'unfed-bus',
            ['buses', index],
            bus.id,
            `busbar ${busName(study, bus.id)}`,
            'no source in service reaches it; connect it by a transformer, cable or coupler, or remove it',
          ),
        ],
  );
}

function partFindings(study: Study, element: StudyElement, index: number): Finding[] {
  if (element.kind === 'bank') return bankFindings(study, element, index);
  const where = fullNameOf(element);
  if (element.kind === 'supply' && element.shortCircuitMVAMin === undefined) {
    return [
      say(
        'fault-level-min',
        ['elements', index, 'shortCircuitMVAMin'],
        undefined,
        where,
        'the minimum fault level is missing; resonance moves with it, so ask the network operator for it as well',
      ),
    ];
  }
  if (element.kind === 'filter') {
    const nominalV = busById(study, element.bus)?.nominalV;
    const rise = element.type === 'c-type' ? 1 : element.tunedOrder ** 2 / (element.tunedOrder ** 2 - 1);
    if (nominalV !== undefined && element.ratedV < nominalV * rise)
      return [underrated(element.ratedV, nominalV * rise, where, index, 'the filter reactor')];
  }
  return [];
}

function underrated(ratedV: number, neededV: number, where: string, index: number, cause: string): Finding {
  return say(
    'capacitor-voltage',
    ['elements', index, 'ratedV'],
    ratedV,
    where,
    `the capacitors are rated ${formatQuantity(ratedV, 'V')} and stand at ${formatQuantity(neededV, 'V', { digits: 3 })} behind ${cause}; choose a rated voltage above that, with room for harmonics and the highest supply voltage`,
  );
}

/** U_C = U/(1 − p); a bank rated far above its busbar gives only (U/U_N)² of its nameplate kvar. */
function bankFindings(study: Study, bank: Bank, index: number): Finding[] {
  const where = fullNameOf(bank);
  const nominalV = busById(study, bank.bus)?.nominalV;
  const findings: Finding[] = [];
  if (bank.steps.length === 0) {
    findings.push(
      say(
        'no-steps',
        ['elements', index, 'steps'],
        bank.steps,
        where,
        'the bank has no steps; add at least one with its kvar',
      ),
    );
  }
  if (nominalV === undefined) return findings;
  const p = (bank.detuningPercent ?? 0) / 100;
  const across = nominalV / (1 - p);
  if (bank.ratedV < nominalV * 0.999) {
    findings.push(
      say(
        'capacitor-voltage',
        ['elements', index, 'ratedV'],
        bank.ratedV,
        where,
        `the capacitors are rated ${formatQuantity(bank.ratedV, 'V')} at a busbar of ${formatQuantity(nominalV, 'V')}; choose a rated voltage of at least the busbar's, or correct the busbar`,
      ),
    );
  } else if (p > 0 && bank.ratedV < across) {
    findings.push(underrated(bank.ratedV, across, where, index, 'the detuning reactor'));
  }
  const share = (nominalV / bank.ratedV) ** 2 / (1 - p);
  if (share < 0.7) {
    findings.push(
      say(
        'kvar-at-rated-voltage',
        ['elements', index, 'ratedV'],
        bank.ratedV,
        where,
        `at ${formatQuantity(nominalV, 'V')} it gives only ${formatQuantity(100 * share, '%', { digits: 3 })} of its nameplate kvar, which count at ${formatQuantity(bank.ratedV, 'V')}; check whether the steps are meant at the busbar's voltage`,
      ),
    );
  }
  return findings;
}

function criteriaFindings(study: Study): Finding[] {
  const findings: Finding[] = [];
  if (!study.buses.some((bus) => bus.pcc)) {
    findings.push(
      say(
        'no-pcc',
        ['buses'],
        undefined,
        '',
        'no busbar is marked as point of common coupling; mark the one where the network operator judges the site',
      ),
    );
  }
  if (study.criteria?.demandCurrentA === undefined) {
    const text = `the maximum demand current I_L is missing; TDD and the row of current limits need it, so take it from the bills`;
    findings.push(say('no-demand-current', ['criteria', 'demandCurrentA'], undefined, '', text));
  }
  return findings;
}
