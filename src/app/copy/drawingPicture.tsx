import { PAPER_INK, phaseInk } from '../../charts/index.ts';
import { drawingSize, layoutStudy, printPalette, StaticDrawing } from '../../drawing/index.ts';
import { freshAnswer, type Workbench } from '../../store/index.ts';
import { phaseColoursOf, type Study, studyInCase } from '../../study/index.ts';
import type { HandedOn } from './handOn.ts';
import { partValues } from './partValues.ts';
import { FONTS } from './standaloneSvg.ts';

/** The single-line diagram on paper as it stands, with its marks; its parts as a table. */
export function drawingPicture(state: Workbench, study: Study): HandedOn {
  const { caseId, readingMode, order } = state.view;
  const answer = freshAnswer(state);
  const layout = layoutStudy(study);
  const { accent, current, reactive, pass, watch, fail, hairline } = PAPER_INK;
  const inks = { accent, current, reactive, pass, watch, fail, hairline };
  const palette = { ...printPalette, ...inks, phases: phaseInk(phaseColoursOf(study), 'light') };
  return {
    name: `${study.title}, single-line diagram`,
    ...drawingSize(study, layout),
    figure: (
      <StaticDrawing
        study={study}
        caseId={caseId}
        layout={layout}
        solution={answer?.solution ?? null}
        verdicts={answer?.verdicts ?? []}
        readingMode={readingMode}
        order={order}
        palette={palette}
        fontFamily={FONTS}
      />
    ),
    values: partValues(studyInCase(study, caseId)),
  };
}
