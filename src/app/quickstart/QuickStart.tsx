import { type FormEvent, useEffect, useId, useMemo, useRef, useState } from 'react';
import { useStore } from 'zustand';
import { quickSite } from '../../sizing/index.ts';
import { useWorkbench, workbench } from '../../store/index.ts';
import {
  type AnswerKey,
  answerFields,
  answerIssues,
  figuresOf,
  formatNumber,
  quickStartEdit,
  type SiteAnswers,
  withTyped,
} from '../../study/index.ts';
import { QuickChoice, QuickQuantity } from './QuickField.tsx';
import { QuickPreview } from './QuickPreview.tsx';
import { answerFor, listAssumptions, quickAnswers, setAnswers } from './quickAnswers.ts';
import './quickstart.css';

/** The commonest site from eight figures, on the paper of an empty study: bill, transformer, drives. */
export function QuickStart() {
  const answers = useStore(quickAnswers, (state) => state.answers);
  const [typed, setTyped] = useState<SiteAnswers | null>(null);
  const form = useRef<HTMLFormElement>(null);
  const title = useId();
  const documentId = useWorkbench((state) => state.documentId);
  useEffect(() => answerFor(documentId), [documentId]);
  useFocusWhenAsked(form);
  const shown = typed ?? answers;
  const figures = useMemo(() => figuresOf(shown), [shown]);
  const issues = useMemo(() => answerIssues(shown), [shown]);

  const quantity = (key: Exclude<AnswerKey, 'system' | 'driveKind'>, fallback?: number) => ({
    field: answerFields[key],
    value: answers[key],
    fallback,
    issues: issues.filter((issue) => issue.key === key),
    onCommit: (value: number | undefined) => {
      setTyped(null);
      setAnswers({ [key]: value });
      return null;
    },
  });
  const follow = ({ target }: FormEvent) => {
    if (!(target instanceof HTMLInputElement)) return;
    const key = target.closest<HTMLElement>('[data-answer]')?.dataset.answer;
    if (key) setTyped(withTyped(answers, (key === 'hours' ? 'peakKW' : key) as AnswerKey, target.value));
  };
  const draw = (event: FormEvent) => {
    event.preventDefault();
    if (form.current?.querySelector('[aria-invalid="true"]')) return;
    drawSite(quickAnswers.getState().answers);
  };
  return (
    <form
      ref={form}
      className="quick-start slip-form"
      aria-labelledby={title}
      onInput={follow}
      onBlur={() => setTyped(null)}
      onSubmit={draw}
    >
      <h2 id={title}>Quick start: one transformer, its bill and its drives</h2>
      <div className="quick-groups">
        <fieldset>
          <legend>Supply</legend>
          <QuickChoice
            field={answerFields.system}
            value={answers.system}
            onChange={(value) => setAnswers({ system: value as NonNullable<SiteAnswers['system']> })}
          />
          <QuickQuantity {...quantity('ratedKVA', answerFields.ratedKVA.default)} />
          <QuickQuantity
            {...quantity('faultLevelMVA')}
            remark={shown.faultLevelMVA === undefined ? 'unknown: worst of 100…500' : undefined}
          />
        </fieldset>
        <fieldset>
          <legend>Bill</legend>
          <QuickQuantity {...quantity('activeKWh', figures.activeKWh)} />
          <QuickQuantity {...quantity('reactiveKvarh', figures.reactiveKvarh)} />
          <PeakOrHours answers={answers} quantity={quantity} kW={figures.kW} />
        </fieldset>
        <fieldset>
          <legend>Drives</legend>
          <QuickQuantity {...quantity('drivesPercent', answerFields.drivesPercent.default)} />
          <QuickChoice
            field={answerFields.driveKind}
            value={answers.driveKind}
            onChange={(value) => setAnswers({ driveKind: value as NonNullable<SiteAnswers['driveKind']> })}
          />
          <details>
            <summary>
              u<sub>k</sub> {formatNumber(figures.ukPercent)} %, target cos φ {formatNumber(figures.targetPF)}
            </summary>
            <QuickQuantity {...quantity('ukPercent', figures.ukPercent)} />
            <QuickQuantity {...quantity('targetPF', answerFields.targetPF.default)} />
          </details>
        </fieldset>
      </div>
      <QuickPreview answers={shown} />
      <div className="quick-go">
        <button type="submit" disabled={issues.some(({ severity }) => severity === 'error')}>
          Draw this site
        </button>
        <span>or Enter in any field. What is left empty is assumed, and listed.</span>
      </div>
    </form>
  );
}

interface PeakProps {
  answers: SiteAnswers;
  quantity(
    key: 'peakKW' | 'hours',
    fallback?: number,
  ): Omit<Parameters<typeof QuickQuantity>[0], 'alternative'>;
  kW: number;
}

/** One line for the peak in kW or the hours of use, whichever the bill states; the unit typed tells. */
function PeakOrHours({ answers, quantity, kW }: PeakProps) {
  const byHours = answers.peakKW === undefined && answers.hours !== undefined;
  const peak = quantity('peakKW', kW);
  const take = (change: SiteAnswers) => {
    peak.onCommit(undefined);
    setAnswers({ peakKW: change.peakKW, hours: change.hours });
    return null;
  };
  const asPeak = {
    field: answerFields.peakKW,
    onCommit: (value: number | undefined) => take(value === undefined ? {} : { peakKW: value }),
  };
  const asHours = {
    field: answerFields.hours,
    onCommit: (value: number | undefined) => take(value === undefined ? {} : { hours: value }),
  };
  return byHours ? (
    <QuickQuantity {...quantity('hours')} issues={peak.issues} {...asHours} alternative={asPeak} />
  ) : (
    <QuickQuantity {...peak} {...asPeak} alternative={asHours} />
  );
}

function drawSite(answers: SiteAnswers): void {
  if (answerIssues(answers).some(({ severity }) => severity === 'error')) return;
  workbench.getState().edit(quickStartEdit(quickSite(answers).drawn));
  listAssumptions(true);
  // The form goes with the empty paper; the keyboard stays on the drawing that takes its place.
  requestAnimationFrame(() =>
    document.querySelector<HTMLElement>('[data-drawing-pane]')?.focus({ preventScroll: true }),
  );
}

function useFocusWhenAsked(form: React.RefObject<HTMLFormElement | null>): void {
  const asked = useStore(quickAnswers, (state) => state.asked);
  const [answered, setAnswered] = useState(0);
  useEffect(() => {
    if (asked === answered) return;
    setAnswered(asked);
    const first = form.current?.querySelector<HTMLElement>('select, input');
    first?.focus();
    first?.scrollIntoView({ block: 'nearest' });
  }, [asked, answered, form]);
}
