import { phaseColourSets, phaseLabelSets } from '../phases.ts';
import type { Edit, PhaseColours, PhaseLabels, Study } from '../types.ts';
import { withView } from './drawnEdits.ts';
import { makeEdit } from './edit.ts';

/** Calls the phases L1 L2 L3 or A B C, on screen and on the sheet. */
export function setPhaseLabels(_study: Study, labels: PhaseLabels): Edit {
  return makeEdit('phases.labels', `call the phases ${phaseLabelSets[labels].join(' ')}`, (current) =>
    withPhases(current, { labels: labels === 'L123' ? undefined : labels }),
  );
}

/** Draws the phases in another set of customary colours. */
export function setPhaseColours(_study: Study, colours: PhaseColours): Edit {
  const words = phaseColourSets.find(({ id }) => id === colours)?.label ?? colours;
  return makeEdit('phases.colours', `draw the phases ${words}`, (current) =>
    withPhases(current, { colours: colours === 'brown-black-grey' ? undefined : colours }),
  );
}

function withPhases(study: Study, change: Record<string, unknown>): Study {
  const phases = { ...study.view?.phases, ...change };
  const chosen = Object.fromEntries(Object.entries(phases).filter(([, value]) => value !== undefined));
  return withView(study, { phases: Object.keys(chosen).length > 0 ? chosen : undefined });
}
