import { workbench } from '../../store/index.ts';
import {
  addCaseByRecipe,
  caseRecipes,
  casesOf,
  duplicateCase,
  moveCase,
  nameOf,
  removeCase,
  type Study,
} from '../../study/index.ts';
import type { Command } from '../commands/command.ts';
import { comparisonFrom } from '../compare/comparisonFrom.ts';
import { setCaseForm } from './caseForms.ts';

function addAndShow(edit: ReturnType<typeof duplicateCase>): void {
  workbench.getState().edit(edit);
  workbench.getState().setCase(edit.caseId);
}

function step(study: Study, caseId: string, by: 1 | -1): void {
  const cases = casesOf(study);
  const at = cases.findIndex(({ id }) => id === caseId) + by;
  const next = cases.at(at % cases.length);
  if (next) workbench.getState().setCase(next.id);
}

function toggleMargin(listed: 'cases' | 'findings'): void {
  const { view, setMargin, setPlace } = workbench.getState();
  setPlace('site');
  setMargin(view.margin === listed && view.place === 'site' ? null : listed);
}

function toggleComparison(study: Study, caseId: string): void {
  const { view, compareCases, setPlace } = workbench.getState();
  setPlace('site');
  compareCases(view.compared && view.place === 'site' ? null : comparisonFrom(study, caseId));
}

/** What can be done with the operating cases, and the way to each. */
export function caseCommands(study: Study, caseId: string): Command[] {
  const cases = casesOf(study);
  const current = cases.find(({ id }) => id === caseId);
  const name = current ? nameOf(current) : caseId;
  const several = cases.length > 1;
  const { edit } = workbench.getState();
  return [
    { id: 'case.choose', words: 'Choose a case…', keys: 'K', run: () => setCaseForm('menu') },
    {
      id: 'case.next',
      words: 'Next case',
      keys: '] or F8',
      enabled: several,
      run: () => step(study, caseId, 1),
    },
    {
      id: 'case.previous',
      words: 'Previous case',
      keys: '[ or Shift+F8',
      enabled: several,
      run: () => step(study, caseId, -1),
    },
    {
      id: 'case.compare',
      words: 'Compare two cases side by side',
      keys: 'V',
      run: () => toggleComparison(study, caseId),
    },
    {
      id: 'case.list',
      words: 'Cases and what differs in them',
      keys: 'X',
      run: () => toggleMargin('cases'),
    },
    { id: 'findings.list', words: 'Findings about the data', keys: '!', run: () => toggleMargin('findings') },
    { id: 'case.new', words: 'New case…', run: () => setCaseForm('new') },
    {
      id: 'case.duplicate',
      words: `Duplicate ${name}`,
      enabled: current !== undefined,
      run: () => addAndShow(duplicateCase(study, caseId)),
    },
    {
      id: 'case.form',
      words: `Name, description, role and hours of ${name}…`,
      run: () => setCaseForm('details'),
    },
    {
      id: 'case.up',
      words: `Move ${name} up`,
      enabled: cases[0]?.id !== caseId,
      run: () => edit(moveCase(study, caseId, -1)),
    },
    {
      id: 'case.down',
      words: `Move ${name} down`,
      enabled: cases.at(-1)?.id !== caseId,
      run: () => edit(moveCase(study, caseId, 1)),
    },
    {
      id: 'case.remove',
      words: `Remove ${name}`,
      enabled: several,
      run: () => edit(removeCase(study, caseId)),
    },
    ...cases.map((one) => ({
      id: `case.show.${one.id}`,
      words: `Case: ${nameOf(one)}`,
      run: () => workbench.getState().setCase(one.id),
    })),
    ...caseRecipes(study, caseId)
      .flatMap(({ recipes }) => recipes)
      .map((recipe) => ({
        id: `case.recipe.${recipe.id}`,
        words: `New case from ${name}: ${recipe.words}`,
        run: () => addAndShow(addCaseByRecipe(study, caseId, recipe)),
      })),
  ];
}
