import type { Edit, Study, StudyElement } from '../../src/study/index.ts';

/** A small invented site with two cases. */
export const site: Study = {
  format: 'varwright-study',
  version: 1,
  title: 'Fernhill dairy',
  frequencyHz: 50,
  maxOrder: 13,
  buses: [
    { id: 'in', name: 'Intake', nominalV: 10_000, pcc: true },
    { id: 'main', name: 'Main board', nominalV: 400 },
  ],
  elements: [
    { id: 'grid', kind: 'supply', bus: 'in', shortCircuitMVA: 150, xOverR: 8 },
    {
      id: 't1',
      name: 'T1',
      kind: 'transformer',
      from: 'in',
      to: 'main',
      ratedKVA: 630,
      hvV: 10_000,
      lvV: 400,
      ukPercent: 6,
      loadLossKW: 6.5,
      vectorGroup: 'Dyn5',
    },
    { id: 'pumps', kind: 'motor', bus: 'main', ratedKW: 45, count: 3 },
    { id: 'drives', kind: 'converter', bus: 'main', kW: 90, powerFactor: 0.96, spectrum: 'six-pulse-ideal' },
    { id: 'c1', kind: 'bank', bus: 'main', ratedV: 440, steps: [{ kvar: 50 }, { kvar: 50 }] },
  ],
  cases: [
    { id: 'day', name: 'Day', changes: [] },
    { id: 'night', name: 'Night', role: 'light', changes: [{ element: 'drives', set: { on: false } }] },
  ],
};

/** An edit that renames the study: the smallest there is. */
export function retitle(title: string): Edit {
  return {
    label: 'study.retitle',
    words: `name the study ${title}`,
    apply: (study) => ({ ...study, title }),
  };
}

export function removeElement(id: string): Edit {
  return {
    label: 'element.remove',
    words: `remove ${id}`,
    apply: (study) => ({ ...study, elements: study.elements.filter((element) => element.id !== id) }),
  };
}

export function removeBus(id: string): Edit {
  const stays = (element: StudyElement): boolean =>
    'bus' in element ? element.bus !== id : element.from !== id && element.to !== id;
  return {
    label: 'bus.remove',
    words: `remove ${id}`,
    apply: (study) => ({
      ...study,
      buses: study.buses.filter((bus) => bus.id !== id),
      elements: study.elements.filter(stays),
    }),
  };
}

export const nothing: Edit = { label: 'nothing', words: 'do nothing', apply: (study) => study };
