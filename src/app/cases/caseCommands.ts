import { workbench } from '../../store/index.ts';
import { addCase, casesOf, duplicateCase, nameOf, removeCase, type Study } from '../../study/index.ts';
import type { Command } from '../commands/command.ts';

function addAndOpen(edit: ReturnType<typeof addCase>, openForm: () => void): void {
  workbench.getState().edit(edit);
  workbench.getState().setCase(edit.caseId);
  openForm();
}

function step(study: Study, caseId: string, by: 1 | -1): void {
  const cases = casesOf(study);
  const at = cases.findIndex(({ id }) => id === caseId) + by;
  const next = cases.at(at % cases.length);
  if (next) workbench.getState().setCase(next.id);
}

/** What can be done with the operating cases, and the way to each. */
export function caseCommands(study: Study, caseId: string, openForm: () => void): Command[] {
  const cases = casesOf(study);
  const current = cases.find(({ id }) => id === caseId);
  const name = current ? nameOf(current) : caseId;
  return [
    { id: 'case.new', words: 'New case…', run: () => addAndOpen(addCase(study), openForm) },
    {
      id: 'case.duplicate',
      words: `Duplicate ${name}…`,
      enabled: current !== undefined,
      run: () => addAndOpen(duplicateCase(study, caseId), openForm),
    },
    { id: 'case.form', words: `Name, role and hours of ${name}…`, run: openForm },
    {
      id: 'case.remove',
      words: `Remove ${name}`,
      enabled: cases.length > 1,
      run: () => workbench.getState().edit(removeCase(study, caseId)),
    },
    {
      id: 'case.next',
      words: 'Next case',
      keys: 'F8',
      enabled: cases.length > 1,
      run: () => step(study, caseId, 1),
    },
    {
      id: 'case.previous',
      words: 'Previous case',
      keys: 'Shift+F8',
      enabled: cases.length > 1,
      run: () => step(study, caseId, -1),
    },
    ...cases.map((one) => ({
      id: `case.show.${one.id}`,
      words: `Case: ${nameOf(one)}`,
      run: () => workbench.getState().setCase(one.id),
    })),
  ];
}
