import { useMemo, useState } from 'react';
import { figure } from '../../checks/index.ts';
import { kvarAtBus } from '../../sizing/index.ts';
import { freshAnswer, useWorkbench, workbench } from '../../store/index.ts';
import { addPart, type BankStep, busById, busName, type Study, typicalValues } from '../../study/index.ts';
import { BankTable } from './BankTable.tsx';
import './correction.css';

interface NeedProps {
  study: Study;
  targetPF: number;
}

const STEP_KVAR = 25;

/** Steps of 25 kvar, rated at the capacitors' own voltage, that give at least `kvar` at the busbar's nominal one. */
function stepsFor(study: Study, busId: string, kvar: number): BankStep[] {
  const nominalV = busById(study, busId)?.nominalV ?? 0;
  const { ratedV } = typicalValues('bank', { nominalV, frequencyHz: study.frequencyHz });
  const ratedKvar = kvar * (ratedV / nominalV) ** 2;
  return Array.from({ length: Math.max(1, Math.ceil(ratedKvar / STEP_KVAR)) }, () => ({ kvar: STEP_KVAR }));
}

/** What the chosen busbar needs in the case on screen, with its working. */
function Need({ study, targetPF }: NeedProps) {
  const bus = useWorkbench((state) => state.view.focusBus);
  const answer = useWorkbench(freshAnswer);
  const needs = useMemo(() => {
    if (!answer) return null;
    return {
      now: kvarAtBus(study, answer.solution, bus, targetPF),
      without: kvarAtBus(study, answer.without, bus, targetPF),
    };
  }, [study, answer, bus, targetPF]);
  if (!needs) return <p className="hint">Solving.</p>;
  const { now, without } = needs;
  if (!now || !without) return <p className="hint">Nothing feeds {busName(study, bus)} in this case.</p>;
  const propose = () => {
    const { edit, setPlace } = workbench.getState();
    edit(
      addPart(study, { kind: 'bank', bus, values: { steps: stepsFor(study, bus, without.additionalKvar) } }),
    );
    setPlace('site');
  };
  return (
    <>
      <dl className="nameplate">
        <dt>at</dt>
        <dd>{busName(study, bus)}</dd>
        <dt>power through it</dt>
        <dd>
          {figure(now.kW)} <span className="unit">kW</span>
        </dd>
        <dt>cos φ without correction</dt>
        <dd>{without.displacementPF === null ? 'no current' : figure(without.displacementPF)}</dd>
        <dt>cos φ as drawn</dt>
        <dd>{now.displacementPF === null ? 'no current' : figure(now.displacementPF)}</dd>
        <dt>needed in all</dt>
        <dd>
          <strong>{figure(without.additionalKvar)}</strong> <span className="unit">kvar</span>
        </dd>
        <dt>{now.additionalKvar >= 0 ? 'still missing' : 'beyond the target'}</dt>
        <dd>
          <strong>{figure(Math.abs(now.additionalKvar))}</strong> <span className="unit">kvar</span>
        </dd>
      </dl>
      {without.working.map(({ equation, numbers }) => (
        <p key={equation} className="working">
          {equation}
          <br />
          {numbers}
        </p>
      ))}
      {without.additionalKvar > 0 && (
        <button type="button" className="plain-button" onClick={propose}>
          Hang a plain bank in steps of 25 kvar from {busName(study, bus)}
        </button>
      )}
      <p className="quiet">
        First order: losses saved upstream and the small rise of voltage are left out; the drawing solves the
        rest. Plain is where to begin, not an answer: read the verdicts of every case before anything is
        ordered.
      </p>
    </>
  );
}

/** How many kvar the site needs, and what each bank found on it is and does. */
export function CorrectionPlace() {
  const study = useWorkbench((state) => state.study);
  const [target, setTarget] = useState<number>();
  if (!study) return <p className="hint">Open a study, a sample, or draw a site first.</p>;
  const targetPF = target ?? study.criteria?.targetPF ?? 0.95;
  return (
    <div className="correction">
      <section aria-label="What the site needs">
        <h2>What the site needs</h2>
        <label className="target">
          target cos φ
          <input
            type="range"
            min={0.85}
            max={1}
            step={0.01}
            value={targetPF}
            onChange={(event) => setTarget(event.target.valueAsNumber)}
          />
          <output>{targetPF.toFixed(2)} lagging</output>
        </label>
        <Need study={study} targetPF={targetPF} />
      </section>
      <section aria-label="Banks and filters">
        <h2>Banks and filters as drawn</h2>
        <BankTable study={study} />
        <p className="quiet">Ratings to order by stand on the results sheet.</p>
      </section>
    </div>
  );
}
