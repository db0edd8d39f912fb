import type { Study } from '../study/index.ts';
import { elementsOfKind, isOn } from '../study/index.ts';

/** Busbars judged as point of common coupling: those marked so, else those that have a supply. */
export function pccBusesOf(study: Study): Set<string> {
  const marked = study.buses.filter((bus) => bus.pcc === true).map((bus) => bus.id);
  return new Set(marked.length > 0 ? marked : elementsOfKind(study, 'supply').map(({ bus }) => bus));
}

/**
 * Busbars where the site's power is metered in a case: the PCCs; for a site on its own generators, with no
 * supply in service, the generators' busbars.
 */
export function meteredBusesOf(study: Study, pccBuses: ReadonlySet<string>): string[] {
  if (elementsOfKind(study, 'supply').some(isOn)) return [...pccBuses];
  const generators = elementsOfKind(study, 'generator').filter(isOn);
  return generators.length > 0 ? [...new Set(generators.map(({ bus }) => bus))] : [...pccBuses];
}
