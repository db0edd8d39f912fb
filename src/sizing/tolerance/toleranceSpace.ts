import type { Bank, Filter, Study, StudyElement, Supply, Transformer } from '../../study/index.ts';
import { isOn, nameOf, studyInCase, withDefaults } from '../../study/index.ts';
import type { Dimension } from './Dimension.ts';
import { defaultTolerances, type ToleranceSettings } from './ToleranceSettings.ts';

/** Capacitors of a filter, where the study states no band: as of a bank. */
const FILTER_TOLERANCE = [-5, 10] as const;
const FILTER_REACTOR_TOLERANCE = [-3, 3] as const;

/**
 * The axes along which a case's parts may stand off their rated values, in study order, switched by the
 * settings. Capacitance: the part's band, its lower end less the ageing; each bank by itself. A bank with no
 * step on, a part out of service and an axis without width are left out.
 */
export function toleranceSpace(
  study: Study,
  caseId: string,
  settings: ToleranceSettings = defaultTolerances,
): Dimension[] {
  const inCase = studyInCase(study, caseId);
  const parts = inCase.elements.filter(isOn);
  const axes = [...parts.flatMap((part) => axesOf(part, inCase, settings)), ...siteAxes(parts, settings)];
  return axes.filter(({ kind, low, high }) => settings.on[kind] && high > low);
}

function axesOf(part: StudyElement, study: Study, settings: ToleranceSettings): Dimension[] {
  switch (part.kind) {
    case 'bank':
      return part.steps.some((step) => step.on !== false) ? bankAxes(part, study, settings) : [];
    case 'filter':
      return filterAxes(part, settings);
    case 'transformer':
      return part.ukTested === true ? [] : [transformerAxis(part, settings)];
    case 'supply':
      return supplyAxes(part, settings);
    default:
      return [];
  }
}

function bankAxes(bank: Bank, study: Study, settings: ToleranceSettings): Dimension[] {
  const full = withDefaults(bank, study);
  const ageing = bank.ageingPercent ?? settings.ageingPercent;
  const axes = [capacitanceAxis(bank, full.tolerancePercent, ageing)];
  if (full.detuningPercent > 0) axes.push(inductanceAxis(bank, full.reactorTolerancePercent));
  return axes;
}

/** A c-type's two capacitors and its choke are matched at the fundamental; only whole it has a band. */
function filterAxes(filter: Filter, settings: ToleranceSettings): Dimension[] {
  const capacitance = capacitanceAxis(filter, FILTER_TOLERANCE, settings.ageingPercent);
  return filter.type === 'c-type'
    ? [capacitance]
    : [capacitance, inductanceAxis(filter, FILTER_REACTOR_TOLERANCE)];
}

function capacitanceAxis(
  part: Bank | Filter,
  [minus, plus]: readonly [number, number],
  ageingPercent: number,
): Dimension {
  return {
    kind: 'capacitance',
    part: part.id,
    words: `capacitance of ${nameOf(part)}`,
    low: (1 + Math.min(0, minus) / 100) * (1 - ageingPercent / 100),
    high: 1 + Math.max(0, plus) / 100,
  };
}

function inductanceAxis(part: Bank | Filter, [minus, plus]: readonly [number, number]): Dimension {
  return {
    kind: 'inductance',
    part: part.id,
    words: `reactor of ${nameOf(part)}`,
    low: 1 + Math.min(0, minus) / 100,
    high: 1 + Math.max(0, plus) / 100,
  };
}

/** The lower end never falls below what the load losses alone make of uk. */
function transformerAxis(part: Transformer, { ukPercent }: ToleranceSettings): Dimension {
  const lossShare = (100 * part.loadLossKW) / part.ratedKVA / part.ukPercent;
  return {
    kind: 'transformer-impedance',
    part: part.id,
    words: `uk of ${nameOf(part)}`,
    low: Math.max(1 - ukPercent / 100, Math.min(1, 1.001 * lossShare)),
    high: 1 + ukPercent / 100,
  };
}

function supplyAxes(part: Supply, settings: ToleranceSettings): Dimension[] {
  const axes: Dimension[] = [];
  if (part.shortCircuitMVAMin !== undefined)
    axes.push({
      kind: 'fault-level',
      part: part.id,
      words: `fault level of ${nameOf(part)}`,
      low: Math.min(1, part.shortCircuitMVAMin / part.shortCircuitMVA),
      high: 1,
    });
  const band = settings.supplyVoltagePercent / 100;
  axes.push({
    kind: 'supply-voltage',
    part: part.id,
    words: `voltage of ${nameOf(part)}`,
    low: 1 - band,
    high: 1 + band,
  });
  if ((part.background ?? []).some(({ percent }) => percent > 0))
    axes.push({
      kind: 'background',
      part: part.id,
      words: `background distortion of ${nameOf(part)}`,
      low: 0,
      high: 1,
    });
  return axes;
}

function siteAxes(parts: readonly StudyElement[], settings: ToleranceSettings): Dimension[] {
  const onGrid = parts.some((part) => part.kind === 'supply');
  const band = (onGrid ? settings.gridFrequencyPercent : settings.generatorFrequencyPercent) / 100;
  const axes: Dimension[] = [{ kind: 'frequency', words: 'frequency', low: 1 - band, high: 1 + band }];
  if (parts.some((part) => part.kind === 'motor'))
    axes.push({ kind: 'motors', words: 'motors running', low: 0, high: 1 });
  return axes;
}
