import { addCaseByRecipe, type CaseRecipe, caseRecipes, type RecipeGroup } from '../caseRecipes.ts';
import { casesOf, studyInCase } from '../cases.ts';
import { elementById, elementsOfKind, isOn } from '../lookup.ts';
import { fullNameOf } from '../names.ts';
import type { Study } from '../types.ts';
import { type Said, saidOfStudy } from './Said.ts';

/**
 * Operating states in which correction is known to go wrong and that no case of the study looks at: fewer
 * steps, the weak grid, the generator, the coupler's other position, light load. Common practice.
 */
export function coverageFindings(study: Study): Said[] {
  const corrected = study.elements.some(({ kind }) => kind === 'bank' || kind === 'filter');
  const [first] = casesOf(study);
  if (!corrected || !first) return [];
  const states = casesOf(study).map(({ id }) => studyInCase(study, id));
  const groups = caseRecipes(study, first.id);
  const recipesOf = (id: RecipeGroup['id']) => groups.find((group) => group.id === id)?.recipes ?? [];
  const missing = (id: RecipeGroup['id'], why: string, wanted: (recipe: CaseRecipe) => boolean): Said[] =>
    recipesOf(id)
      .filter(wanted)
      .slice(0, 1)
      .map((recipe) => uncovered(study, first.id, recipe, why));
  const everywhere = (element: string, same: (state: Study) => boolean): boolean =>
    states.every((state) => elementById(state, element) !== undefined && same(state));
  return [
    ...missing(
      'step',
      'a resonance that all steps together avoid may meet an order with fewer',
      ({ patches }) => {
        const id = patches[0]?.element ?? '';
        return everywhere(id, (state) => allStepsIn(state, id) && stepCount(state, id) > 1);
      },
    ),
    ...missing('weak', 'every resonance comes lower on the weak grid', ({ patches }) =>
      patches.every(({ element, patch }) =>
        everywhere(element, (state) => !hasFaultLevel(state, element, patch)),
      ),
    ),
    ...elementsOfKind(study, 'generator').flatMap(({ id }) =>
      missing(
        'generator',
        'the bank meets x″d there and may drive the machine leading',
        (recipe) => recipe.id === `generator.${id}` && everywhere(id, (state) => !inService(state, id)),
      ),
    ),
    ...elementsOfKind(study, 'coupler').flatMap(({ id }) =>
      missing(
        'coupler',
        'fault level and correction of both sides join or part there',
        (recipe) =>
          recipe.id === `coupler.${id}` && new Set(states.map((state) => inService(state, id))).size === 1,
      ),
    ),
    ...(casesOf(study).some(({ role }) => role === 'light' || role === 'generator')
      ? []
      : missing('light', 'voltage rises and the site turns leading when the load goes', () => true)),
  ];
}

function inService(state: Study, id: string): boolean {
  const part = elementById(state, id);
  return part !== undefined && isOn(part);
}

function stepCount(state: Study, id: string): number {
  const part = elementById(state, id);
  return part?.kind === 'bank' ? part.steps.length : 0;
}

function allStepsIn(state: Study, id: string): boolean {
  const part = elementById(state, id);
  return part?.kind === 'bank' && part.steps.every(({ on }) => on !== false);
}

function hasFaultLevel(state: Study, id: string, patch: CaseRecipe['patches'][number]['patch']): boolean {
  const part = elementById(state, id);
  return part?.kind === 'supply' && part.shortCircuitMVA === patch.shortCircuitMVA;
}

function uncovered(study: Study, fromCaseId: string, recipe: CaseRecipe, why: string): Said {
  const [only, more] = recipe.patches;
  const part = only && !more ? elementById(study, only.element) : undefined;
  const words = `add case ${recipe.name}`;
  return {
    ...saidOfStudy(['cases'], {
      code: 'state-not-covered',
      severity: 'note',
      value: recipe.id,
      text: `no case looks at the state "${recipe.name}"; ${why}`,
      mend: words,
      repair: {
        words,
        scope: recipe.id,
        make: (current) => addCaseByRecipe(current, fromCaseId, recipe),
      },
    }),
    ...(part ? { subject: { kind: 'element' as const, id: part.id } } : {}),
    where: part ? fullNameOf(part) : '',
  };
}
