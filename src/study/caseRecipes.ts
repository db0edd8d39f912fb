import { casesOf, studyInCase } from './cases.ts';
import { type AddCaseEdit, addCase } from './edits/caseEdits.ts';
import { joinEdits, type Patch } from './edits/edit.ts';
import { updateElement } from './edits/updates.ts';
import { fedBuses } from './findings/feeding.ts';
import { elementsOfKind, isOn } from './lookup.ts';
import { fullNameOf, nameOf } from './names.ts';
import type { Bank, CaseRole, ElementKind, Generator, Study, StudyElement, Transformer } from './types.ts';
import { formatQuantity } from './units/formatQuantity.ts';
import { withDefaults } from './withDefaults.ts';

/** A common operating state that can be made from one that stands: what it changes there, and its words. */
export interface CaseRecipe {
  id: string;
  /** As a menu offers it: "Bank C1 with one step fewer". */
  words: string;
  name: string;
  description: string;
  /** Absent: that of the state it starts from. */
  role?: CaseRole;
  patches: readonly { element: string; patch: Patch }[];
}

/** One sort of common state; without recipes it says why there are none. */
export interface RecipeGroup {
  id: 'light' | 'step' | 'weak' | 'generator' | 'coupler' | 'transformer' | 'motors';
  title: string;
  recipes: readonly CaseRecipe[];
  /** What would allow it; '' where it is allowed. */
  missing: string;
}

export interface RecipeSettings {
  /** What the loads draw in the light-load case, per cent of the state it starts from. */
  lightPercent: number;
}

export const usualLightPercent = 30;

/** The common states that can be made from a case, in the order they are usually looked at. */
export function caseRecipes(
  study: Study,
  fromCaseId: string,
  { lightPercent }: RecipeSettings = { lightPercent: usualLightPercent },
): RecipeGroup[] {
  const here = studyInCase(study, fromCaseId);
  const group = (
    id: RecipeGroup['id'],
    title: string,
    recipes: CaseRecipe[],
    missing: string,
  ): RecipeGroup => ({
    id,
    title,
    recipes,
    missing: recipes.length > 0 ? '' : missing,
  });
  return [
    group('light', 'Light load', lightLoad(here, lightPercent), 'no load, motor or drive is in service'),
    group('step', 'One step fewer', kindIn(here, 'bank').flatMap(oneStepFewer), 'no bank has a step in'),
    group(
      'weak',
      'Minimum fault level',
      weakGrid(here),
      'no supply has a minimum fault level below its maximum',
    ),
    group(
      'generator',
      'On the generator',
      elementsOfKind(here, 'generator').map((one) => onGenerator(here, one)),
      'there is no generator',
    ),
    group(
      'coupler',
      'Coupler',
      elementsOfKind(here, 'coupler').map(couplerTurned),
      'there is no bus coupler',
    ),
    group(
      'transformer',
      'Transformer out',
      kindIn(here, 'transformer').map((one) => transformerOut(here, one)),
      'no transformer is in service',
    ),
    group('motors', 'Motors off', motorsOff(here), 'no motor is in service'),
  ];
}

function kindIn<K extends ElementKind>(here: Study, kind: K) {
  return elementsOfKind(here, kind).filter(isOn);
}

const three = (value: number): number => Number(value.toPrecision(3));

/** Every load, motor and drive at a share of what it draws; what feeds in stays. */
function lightLoad(here: Study, percent: number): CaseRecipe[] {
  const share = percent / 100;
  const patches = here.elements.flatMap((part): CaseRecipe['patches'][number][] => {
    if (!isOn(part)) return [];
    if (part.kind === 'load' || (part.kind === 'converter' && part.kW > 0))
      return [{ element: part.id, patch: { kW: three(part.kW * share) } }];
    if (part.kind !== 'motor') return [];
    return [
      { element: part.id, patch: { loadPercent: three(withDefaults(part, here).loadPercent * share) } },
    ];
  });
  if (patches.length === 0) return [];
  const shown = formatQuantity(percent, '%');
  return [
    {
      id: 'light',
      words: `Light load: all loads at ${shown}`,
      name: `Light load, ${shown}`,
      description: `All loads, motors and drives at ${shown} of what they draw otherwise; banks as they were.`,
      role: 'light',
      patches,
    },
  ];
}

function oneStepFewer(bank: Bank): CaseRecipe[] {
  const last = bank.steps.findLastIndex((step) => step.on !== false);
  const step = bank.steps[last];
  if (!step) return [];
  const steps = bank.steps.with(last, { ...step, on: false });
  const left = steps.filter(({ on }) => on !== false).length;
  const states = `${left} of ${steps.length} steps`;
  return [
    {
      id: `step.${bank.id}`,
      words: `${fullNameOf(bank)} with one step fewer: ${states}`,
      name: `${nameOf(bank)}: ${states}`,
      description: `${fullNameOf(bank)} with ${states} in. A resonance the full bank avoids may meet an order here.`,
      patches: [{ element: bank.id, patch: { steps } }],
    },
  ];
}

function weakGrid(here: Study): CaseRecipe[] {
  const patches = kindIn(here, 'supply').flatMap(({ id, shortCircuitMVA, shortCircuitMVAMin }) =>
    shortCircuitMVAMin !== undefined && shortCircuitMVAMin < shortCircuitMVA
      ? [{ element: id, patch: { shortCircuitMVA: shortCircuitMVAMin } }]
      : [],
  );
  if (patches.length === 0) return [];
  return [
    {
      id: 'weak',
      words: 'Supply at its minimum fault level',
      name: 'Minimum fault level',
      description: 'The network operator’s weakest state: every resonance comes lower and rises.',
      patches,
    },
  ];
}

function onGenerator(here: Study, generator: Generator): CaseRecipe {
  const others = here.elements.filter(
    (part) => (part.kind === 'supply' || part.kind === 'generator') && part.id !== generator.id && isOn(part),
  );
  return {
    id: `generator.${generator.id}`,
    words: `On ${fullNameOf(generator)} alone`,
    name: `On ${fullNameOf(generator)}`,
    description: `Supply open, ${fullNameOf(generator)} alone feeds the site. Banks stay in: interlock them off on the generator unless this case proves them harmless.`,
    role: 'generator',
    patches: [
      ...others.map(({ id }) => ({ element: id, patch: { on: false } })),
      { element: generator.id, patch: { on: true } },
    ],
  };
}

function couplerTurned(coupler: StudyElement): CaseRecipe {
  const closes = !isOn(coupler);
  const state = closes ? 'closed' : 'open';
  return {
    id: `coupler.${coupler.id}`,
    words: `${fullNameOf(coupler)} ${state}`,
    name: `${nameOf(coupler)} ${state}`,
    description: `${fullNameOf(coupler)} ${state}: fault level, load and correction of its busbars are ${closes ? 'together' : 'apart'}.`,
    patches: [{ element: coupler.id, patch: { on: closes } }],
  };
}

/** A coupler that would feed what the transformer leaves dead is closed with it. */
function transformerOut(here: Study, transformer: Transformer): CaseRecipe {
  const before = fedBuses(here);
  const after = fedBuses({ ...here, elements: here.elements.filter(({ id }) => id !== transformer.id) });
  const dead = [...before].filter((bus) => !after.has(bus));
  const helper = elementsOfKind(here, 'coupler').find(
    (one) =>
      !isOn(one) &&
      (dead.includes(one.from) ? after.has(one.to) : dead.includes(one.to) && after.has(one.from)),
  );
  const closed = helper ? `, ${nameOf(helper)} closed` : '';
  const left = dead.length > 0 && !helper ? ' What hangs below it is without supply.' : '';
  return {
    id: `transformer.${transformer.id}`,
    words: `${fullNameOf(transformer)} out${closed}`,
    name: `${nameOf(transformer)} out${closed}`,
    description: `${fullNameOf(transformer)} out of service${helper ? `, its load taken over through ${fullNameOf(helper)}` : ''}.${left}`,
    patches: [
      { element: transformer.id, patch: { on: false } },
      ...(helper ? [{ element: helper.id, patch: { on: true } }] : []),
    ],
  };
}

function motorsOff(here: Study): CaseRecipe[] {
  const motors = kindIn(here, 'motor');
  if (motors.length === 0) return [];
  return [
    {
      id: 'motors',
      words: 'All motors off',
      name: 'Motors off',
      description: 'No motor runs: their damping is gone, and peaks stand higher and elsewhere.',
      patches: motors.map(({ id }) => ({ element: id, patch: { on: false } })),
    },
  ];
}

/** Adds the recipe's case: the changes of the state it starts from, and its own. One step of undo. */
export function addCaseByRecipe(study: Study, fromCaseId: string, recipe: CaseRecipe): AddCaseEdit {
  const from = casesOf(study).find(({ id }) => id === fromCaseId);
  const changes = study.cases?.find(({ id }) => id === fromCaseId)?.changes ?? [];
  const starting = changes.length > 0 && from ? ` Starts from ${nameOf(from)}.` : '';
  const role = recipe.role ?? from?.role ?? 'load';
  const added = addCase(study, {
    name: freeCaseName(study, recipe.name),
    description: `${recipe.description}${starting}`,
    ...(role === 'load' ? {} : { role }),
    changes,
  });
  const { caseId } = added;
  const edit = joinEdits(added.label, added.words, [
    () => added,
    ...recipe.patches.map(
      ({ element, patch }) =>
        (current: Study) =>
          updateElement(current, element, patch, { caseId }),
    ),
  ]);
  return { ...edit, caseId };
}

function freeCaseName(study: Study, name: string): string {
  const taken = new Set(casesOf(study).map(nameOf));
  let free = name;
  for (let counter = 2; taken.has(free); counter += 1) free = `${name} (${counter})`;
  return free;
}
