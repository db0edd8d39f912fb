import { baseStateId, casesOf, type Study } from '../study/index.ts';
import type { ComparedCases, View } from './types.ts';

const firstView: View = {
  place: 'site',
  caseId: 'base',
  focusBus: '',
  order: 1,
  readingMode: 'fundamental',
  selection: [],
  openSlip: null,
  theme: 'system',
  timeCursor: 0,
  waveOrders: 'all',
  margin: null,
  verdictScope: 'case',
  compared: null,
};

/** The view of a workbench without a study. */
export function emptyView(theme: View['theme'] = 'system'): View {
  return { ...firstView, theme };
}

/** The view a freshly opened study starts with: where it was last looked at, else where correction is. */
export function openingView(study: Study, before: View): View {
  const view: View = {
    ...firstView,
    theme: before.theme,
    place: before.place,
    readingMode: before.readingMode,
    margin: before.margin,
    caseId: study.view?.caseId ?? '',
    focusBus: study.view?.focusBus ?? '',
  };
  return fitView(view, study);
}

/** The view with everything the study no longer has left out; the same object where all is in place. */
export function fitView(view: View, study: Study): View {
  const items = itemsOf(study);
  const caseIds = casesOf(study).map((operating) => operating.id);
  const selection = view.selection.filter((item) => items.has(item));
  const fitted: View = {
    ...view,
    caseId: caseIds.includes(view.caseId) ? view.caseId : (caseIds[0] ?? 'base'),
    focusBus: study.buses.some((bus) => bus.id === view.focusBus) ? view.focusBus : telltaleBus(study),
    selection: selection.length === view.selection.length ? view.selection : selection,
    openSlip: view.openSlip !== null && items.has(view.openSlip) ? view.openSlip : null,
    compared: view.compared && areComparable(study, view.compared) ? view.compared : null,
  };
  const same = (Object.keys(fitted) as (keyof View)[]).every((key) => fitted[key] === view[key]);
  return same ? view : fitted;
}

/** Whether both are cases of the study, or its base state. */
export function areComparable(study: Study, { a, b }: ComparedCases): boolean {
  const known = new Set([baseStateId, ...casesOf(study).map(({ id }) => id)]);
  return known.has(a) && known.has(b);
}

function itemsOf(study: Study): Set<string> {
  return new Set([
    ...study.buses.map((bus) => `bus:${bus.id}`),
    ...study.elements.map((element) => `element:${element.id}`),
  ]);
}

/** The busbar worth listening to first: the first with a bank or filter, else with a converter, else any. */
function telltaleBus(study: Study): string {
  const wanted = [['bank', 'filter'], ['converter']];
  for (const kinds of wanted) {
    const part = study.elements.find((element) => kinds.includes(element.kind));
    if (part && 'bus' in part) return part.bus;
  }
  return study.buses.at(-1)?.id ?? '';
}
