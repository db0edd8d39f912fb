import type { Study } from '../study/index.ts';
import { isOn } from '../study/index.ts';

/** Busbars judged as point of common coupling: those marked so, else those of the supplies in service. */
export function pccBusesOf(study: Study): Set<string> {
  const marked = study.buses.filter((bus) => bus.pcc === true).map((bus) => bus.id);
  if (marked.length > 0) return new Set(marked);
  return new Set(
    study.elements
      .filter((part) => part.kind === 'supply' && isOn(part))
      .flatMap((part) => ('bus' in part ? [part.bus] : [])),
  );
}
