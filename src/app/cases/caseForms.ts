import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';

/** What lies open about the cases, under their name in the header: nothing, the list, the form, the common states. */
export type CaseForm = 'menu' | 'details' | 'new' | null;

const open = createStore<{ form: CaseForm }>()(() => ({ form: null }));

export function setCaseForm(form: CaseForm): void {
  open.setState({ form });
}

/** Puts the menu away, unless what was chosen in it has opened a form since. */
export function closeCaseMenu(): void {
  open.setState(({ form }) => (form === 'menu' ? { form: null } : {}));
}

export function openCaseForm(): void {
  setCaseForm('details');
}

export function useCaseForm(): CaseForm {
  return useStore(open, ({ form }) => form);
}
