import { useMemo, useState } from 'react';
import { Button, Dialog, Heading } from 'react-aria-components';
import { workbench } from '../../store/index.ts';
import {
  addCase,
  addCaseByRecipe,
  type CaseRecipe,
  caseDifferences,
  caseRecipes,
  casesOf,
  nameOf,
  parseQuantity,
  type RecipeGroup,
  type Study,
  usualLightPercent,
} from '../../study/index.ts';
import { useFocusField } from '../fields/useFocusField.ts';
import { setCaseForm } from './caseForms.ts';

interface Props {
  study: Study;
  caseId: string;
}

const empty = 'empty';

/** A new case: a common operating state made from one that stands, or one without changes to be made by hand. */
export function NewCaseForm({ study, caseId }: Props) {
  const [from, setFrom] = useState(caseId);
  const [percentText, setPercentText] = useState(String(usualLightPercent));
  const [chosen, setChosen] = useState(empty);
  const percent = readPercent(percentText);
  useFocusField(`new-case-${empty}`);
  const groups = useMemo(
    () => caseRecipes(study, from, { lightPercent: percent ?? usualLightPercent }),
    [study, from, percent],
  );
  const recipe = groups.flatMap(({ recipes }) => recipes).find(({ id }) => id === chosen);
  const needsPercent = chosen === 'light' && percent === null;
  const add = () => {
    const edit = recipe ? addCaseByRecipe(study, from, recipe) : addCase(study);
    workbench.getState().edit(edit);
    workbench.getState().setCase(edit.caseId);
    setCaseForm(recipe ? null : 'details');
  };
  return (
    <Dialog className="case-form new-case">
      <Heading slot="title">New case</Heading>
      <form
        onSubmit={(event) => {
          event.preventDefault();
          if (!needsPercent) add();
        }}
      >
        <label className="new-case-from">
          starting from
          <select value={from} onChange={(event) => setFrom(event.target.value)}>
            {casesOf(study).map((one) => (
              <option key={one.id} value={one.id}>
                {nameOf(one)}
              </option>
            ))}
          </select>
        </label>
        <fieldset>
          <legend className="visually-hidden">State</legend>
          <Choice id={empty} chosen={chosen} onChoose={setChosen}>
            No changes yet, to be made by hand
          </Choice>
          {groups.map((group) => (
            <GroupChoices key={group.id} group={group} chosen={chosen} onChoose={setChosen} />
          ))}
        </fieldset>
        {chosen === 'light' && (
          <label className="new-case-from">
            loads at
            <input
              value={percentText}
              inputMode="decimal"
              aria-invalid={percent === null}
              aria-describedby="light-percent-allowed"
              onChange={(event) => setPercentText(event.target.value)}
            />
            % of what they draw
            <span id="light-percent-allowed" className={percent === null ? 'slip-error' : 'visually-hidden'}>
              Give more than 0 and up to 100 %.
            </span>
          </label>
        )}
        <Preview study={study} from={from} recipe={recipe} />
        <footer>
          <Button className="plain-button" type="submit" isDisabled={needsPercent}>
            Add the case
          </Button>
          <Button className="plain-button" onPress={() => setCaseForm(null)}>
            Cancel
          </Button>
        </footer>
      </form>
    </Dialog>
  );
}

function readPercent(text: string): number | null {
  const parsed = parseQuantity(text, '%');
  return parsed.ok && parsed.value > 0 && parsed.value <= 100 ? parsed.value : null;
}

interface ChoiceProps {
  id: string;
  chosen: string;
  onChoose(id: string): void;
  children: React.ReactNode;
}

function Choice({ id, chosen, onChoose, children }: ChoiceProps) {
  return (
    <label className="new-case-choice">
      <input
        id={`new-case-${id}`}
        type="radio"
        name="new-case"
        value={id}
        checked={chosen === id}
        onChange={() => onChoose(id)}
      />
      <span className="capital">{children}</span>
    </label>
  );
}

function GroupChoices({
  group,
  chosen,
  onChoose,
}: {
  group: RecipeGroup;
  chosen: string;
  onChoose(id: string): void;
}) {
  if (group.recipes.length === 0)
    return (
      <p className="new-case-missing">
        {group.title}: {group.missing}
      </p>
    );
  return group.recipes.map((recipe) => (
    <Choice key={recipe.id} id={recipe.id} chosen={chosen} onChoose={onChoose}>
      {recipe.words}
    </Choice>
  ));
}

/** What the chosen state would change, before it is added. */
function Preview({ study, from, recipe }: { study: Study; from: string; recipe: CaseRecipe | undefined }) {
  const differences = useMemo(() => {
    if (!recipe) return [];
    const edit = addCaseByRecipe(study, from, recipe);
    return caseDifferences(edit.apply(study), edit.caseId);
  }, [study, from, recipe]);
  if (!recipe)
    return <p className="quiet-line">A case without changes; its parts are changed on their slips.</p>;
  return (
    <div className="new-case-preview" aria-live="polite">
      <p>{recipe.description}</p>
      <ul>
        {differences.map(({ element, field, mark }) => (
          <li key={`${element.id} ${field}`}>
            {nameOf(element)}: Δ {mark}
          </li>
        ))}
      </ul>
    </div>
  );
}
