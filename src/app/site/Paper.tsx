import { useCallback } from 'react';
import { FigureMenu } from '../../charts/index.ts';
import { Drawing, Outline, type Subject, type TrayKind } from '../../drawing/index.ts';
import { useWorkbench, workbench } from '../../store/index.ts';
import type { Study } from '../../study/index.ts';
import { drawingPicture } from '../copy/drawingPicture.tsx';
import { handOn } from '../copy/handOn.ts';
import { Recent } from '../files/Recent.tsx';
import { Samples } from '../files/Samples.tsx';
import { useFlags } from '../findings/useFlags.ts';
import { Margin } from '../margin/Margin.tsx';
import { usePaper } from '../panels/panelStore.ts';
import { QuickStart } from '../quickstart/QuickStart.tsx';
import { TablePlace } from '../table/TablePlace.tsx';
import { armMark, useMarkTool } from './markTool.ts';
import { PaperSwitch } from './PaperSwitch.tsx';
import { RemovalDialog } from './RemovalDialog.tsx';
import { removeChosen } from './removal.ts';
import { SlipConnection } from './SlipConnection.tsx';

const noVerdicts: never[] = [];

interface Props {
  study: Study;
  letters: ReadonlyMap<string, string>;
  lit: Subject | null;
  armedKind: TrayKind | null;
  onArm(kind: TrayKind | null): void;
  onHover(subject: Subject | null): void;
  /** Opens the study's details at a field. */
  onDetails(field: string | null): void;
}

function select(items: readonly Subject[]): void {
  workbench.getState().select(items);
}

function openSlip(subject: Subject | null): void {
  const state = workbench.getState();
  if (subject === null) state.closeSlip();
  else state.openSlip(subject);
}

/** The drawing, the same site as an outline, or its data as a table. */
export function Paper(props: Props) {
  const { study, letters, lit, armedKind, onArm, onHover } = props;
  const view = useWorkbench((state) => state.view);
  const answer = useWorkbench((state) => state.answer);
  const stale = useWorkbench((state) => state.answer?.revision !== state.revision);
  const probe = useWorkbench((state) => (state.probe?.revision === state.revision ? state.probe : null));
  const openedRevision = useWorkbench((state) => state.openedRevision);
  const said = useWorkbench((state) => state.said);
  const { edit, say, setFocusBus, setReadingMode } = workbench.getState();
  const paper = usePaper();
  const flags = useFlags(study, view.caseId);
  const armedMark = useMarkTool();
  const verdicts = answer?.verdicts ?? noVerdicts;
  const ofCase = answer?.caseId === view.caseId;
  const renderSlip = useCallback(
    (subject: Subject) => <SlipConnection study={study} subject={subject} />,
    [study],
  );
  return (
    <section className="paper" aria-label="Drawing">
      <Margin study={study} onDetails={props.onDetails} />
      {paper === 'table' ? (
        <TablePlace study={study} />
      ) : paper === 'list' && study.buses.length > 0 ? (
        <div className="outline-place">
          <Outline
            study={study}
            caseId={view.caseId}
            selection={view.selection}
            verdicts={verdicts}
            onSelect={select}
            onFocusBus={setFocusBus}
            onOpenSlip={openSlip}
          />
          {view.openSlip && <div className="outline-slip">{renderSlip(view.openSlip)}</div>}
        </div>
      ) : (
        <Drawing
          study={study}
          caseId={view.caseId}
          solution={ofCase ? answer.solution : null}
          stale={stale}
          verdicts={verdicts}
          focusBus={view.focusBus}
          order={view.order}
          readingMode={view.readingMode}
          probe={probe}
          selection={view.selection}
          openSlip={view.openSlip}
          letters={letters}
          flags={flags}
          lit={lit}
          armedKind={armedKind}
          fitKey={String(openedRevision)}
          onSelect={select}
          onFocusBus={setFocusBus}
          onOpenSlip={openSlip}
          onEdit={edit}
          onRemove={removeChosen}
          onSay={say}
          said={said}
          onReadingMode={setReadingMode}
          onArm={onArm}
          armedMark={armedMark}
          onArmMark={armMark}
          onHover={onHover}
          renderSlip={renderSlip}
        >
          <QuickStart />
          <Recent />
          <Samples />
        </Drawing>
      )}
      <PaperSwitch paper={paper} empty={study.buses.length === 0}>
        {paper === 'drawing' && study.buses.length > 0 && (
          <FigureMenu
            name="the drawing"
            onPicture={(way) => void handOn(drawingPicture(workbench.getState(), study), way)}
          />
        )}
      </PaperSwitch>
      <RemovalDialog />
    </section>
  );
}
