import { casesOf } from '../study/index.ts';
import { areComparable } from './fitView.ts';
import type { View, Workbench, WorkbenchActions, WorkbenchState } from './types.ts';

type Set = (change: (state: Workbench) => Partial<WorkbenchState>) => void;
type ViewActions = Pick<
  WorkbenchActions,
  | 'setPlace'
  | 'setCase'
  | 'setFocusBus'
  | 'setOrder'
  | 'setReadingMode'
  | 'setTheme'
  | 'setTimeCursor'
  | 'setWaveOrders'
  | 'setMargin'
  | 'setVerdictScope'
  | 'compareCases'
  | 'askWorst'
  | 'select'
  | 'openSlip'
  | 'closeSlip'
  | 'say'
  | 'setNotice'
  | 'dismissNotice'
>;

function changed(state: Workbench, change: Partial<View>): Partial<WorkbenchState> {
  const same = (Object.keys(change) as (keyof View)[]).every((key) => state.view[key] === change[key]);
  return same ? {} : { view: { ...state.view, ...change } };
}

function caseChange(state: Workbench, caseId: string): Partial<WorkbenchState> {
  const known = state.study && casesOf(state.study).some((operating) => operating.id === caseId);
  if (!known) throw new RangeError(`no case "${caseId}" in the study`);
  return changed(state, { caseId });
}

function focusChange(state: Workbench, focusBus: string): Partial<WorkbenchState> {
  const known = state.study?.buses.some((bus) => bus.id === focusBus);
  if (!known) throw new RangeError(`no busbar "${focusBus}" in the study`);
  return changed(state, { focusBus });
}

function comparison(state: Workbench, compared: View['compared']): Partial<WorkbenchState> {
  if (compared && !(state.study && areComparable(state.study, compared)))
    throw new RangeError(`no cases "${compared.a}" and "${compared.b}" in the study`);
  return changed(state, { compared });
}

export function viewActions(set: Set): ViewActions {
  const change = (part: Partial<View>): void => set((state) => changed(state, part));
  return {
    setPlace: (place) => change({ place }),
    setCase: (caseId) => set((state) => caseChange(state, caseId)),
    setFocusBus: (bus) => set((state) => focusChange(state, bus)),
    setOrder: (order) => {
      if (!(order > 0 && Number.isFinite(order))) throw new RangeError(`order ${order}: must be above 0`);
      change({ order });
    },
    setReadingMode: (readingMode) => change({ readingMode }),
    setTheme: (theme) => change({ theme }),
    setTimeCursor: (fraction) => change({ timeCursor: ((fraction % 1) + 1) % 1 }),
    setWaveOrders: (waveOrders) => change({ waveOrders }),
    setMargin: (margin) => change({ margin }),
    setVerdictScope: (verdictScope) => change({ verdictScope }),
    compareCases: (compared) => set((state) => comparison(state, compared)),
    askWorst: (worstQuestion) => set(() => ({ worstQuestion })),
    select: (selection) => change({ selection }),
    openSlip: (openSlip) => change({ openSlip }),
    closeSlip: () => change({ openSlip: null }),
    say: (said) => set(() => ({ said })),
    setNotice: (notice) => set(() => ({ notice })),
    dismissNotice: () => set(() => ({ notice: null })),
  };
}
