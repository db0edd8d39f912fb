import { phaseInk } from '../../charts/index.ts';
import {
  type Edit,
  type PhaseColours,
  type PhaseLabels,
  phaseColourSets,
  phaseColoursOf,
  phaseLabelSets,
  phaseNamesOf,
  type Study,
  setPhaseColours,
  setPhaseLabels,
} from '../../study/index.ts';

interface Props {
  study: Study;
  onEdit(edit: Edit): void;
}

const labelSets = Object.entries(phaseLabelSets) as [PhaseLabels, (typeof phaseLabelSets)[PhaseLabels]][];
const DASHES = [undefined, '5 2.5', '1.4 2.2'];

/** What the phases are called, and in which customary colours they are drawn, with a sample of each. */
export function PhaseChoice({ study, onEdit }: Props) {
  const names = phaseNamesOf(study);
  const colours = phaseColoursOf(study);
  const chosen = labelSets.find(([, set]) => set[0] === names[0])?.[0] ?? 'L123';
  return (
    <section aria-label="Phases" className="slip-body phase-choice">
      <h3>Phases</h3>
      <fieldset>
        <legend>called</legend>
        {labelSets.map(([id, set]) => (
          <label key={id}>
            <input
              type="radio"
              name="phase-labels"
              checked={chosen === id}
              onChange={() => onEdit(setPhaseLabels(study, id))}
            />
            {set.join(' ')}
          </label>
        ))}
      </fieldset>
      <fieldset>
        <legend>drawn</legend>
        {phaseColourSets.map(({ id, label, source }) => (
          <label key={id}>
            <input
              type="radio"
              name="phase-colours"
              checked={colours === id}
              onChange={() => onEdit(setPhaseColours(study, id))}
            />
            <Sample colours={id} />
            <span>
              {label} <span className="quiet">{source}</span>
            </span>
          </label>
        ))}
      </fieldset>
    </section>
  );
}

/** The three lines as they are drawn, on the ground of the theme. */
function Sample({ colours }: { colours: PhaseColours }) {
  const theme = document.documentElement.dataset.theme === 'dark' ? 'dark' : 'light';
  return (
    <svg width={34} height={18} viewBox="0 0 34 18" aria-hidden="true">
      {phaseInk(colours, theme).map((ink, phase) => {
        const y = 3.5 + 5.5 * phase;
        return (
          <line
            key={y}
            x1={2}
            x2={32}
            y1={y}
            y2={y}
            stroke={ink}
            strokeWidth={2}
            strokeDasharray={DASHES[phase]}
          />
        );
      })}
    </svg>
  );
}
