import { useMemo } from 'react';
import { useStore } from 'zustand';
import { busSubject, Formula, partSubject } from '../../drawing/index.ts';
import { workbench } from '../../store/index.ts';
import { type Assumption, assumptionsOf, nameOf, type Study } from '../../study/index.ts';
import { assumptionWords } from './assumptionWords.ts';
import { listAssumptions, quickAnswers } from './quickAnswers.ts';

function jumpTo({ owner }: Assumption): void {
  if (!owner) return;
  const subject = 'kind' in owner ? partSubject(owner.id) : busSubject(owner.id);
  const { select, openSlip } = workbench.getState();
  select([subject]);
  openSlip(subject);
}

function byOwner(assumptions: readonly Assumption[]): [string, Assumption[]][] {
  const groups = new Map<string, Assumption[]>();
  for (const assumption of assumptions) {
    const name = assumption.owner ? nameOf(assumption.owner) : 'The study';
    groups.set(name, [...(groups.get(name) ?? []), assumption]);
  }
  return [...groups];
}

/** What the study takes as typical or assumed, part by part, over the notes until it is put away. */
export function Assumptions({ study }: { study: Study }) {
  const listed = useStore(quickAnswers, (state) => state.listed);
  const assumptions = useMemo(() => (listed ? assumptionsOf(study) : []), [listed, study]);
  if (!listed || study.elements.length === 0) return null;
  return (
    <section className="assumptions" aria-labelledby="assumptions-title">
      <header>
        <h2 id="assumptions-title">
          Assumed <span className="quiet">{countWords(assumptions.length)}</span>
        </h2>
        <button
          type="button"
          onClick={() => listAssumptions(false)}
          aria-label="Put the list of assumptions away"
        >
          ✕
        </button>
      </header>
      <div className="assumption-list">
        {byOwner(assumptions).map(([name, group]) => (
          <section key={name} aria-label={name}>
            <h3>{name}</h3>
            <ul>
              {group.map((assumption) => (
                <li key={assumption.path}>
                  <AssumptionLine study={study} assumption={assumption} />
                </li>
              ))}
            </ul>
          </section>
        ))}
      </div>
    </section>
  );
}

function countWords(count: number): string {
  if (count === 0) return '· nothing any more';
  return `· ${count} ${count === 1 ? 'value' : 'values'} to check`;
}

function AssumptionLine({ study, assumption }: { study: Study; assumption: Assumption }) {
  const { origin } = assumption;
  const content = (
    <>
      <Formula text={assumptionWords(study, assumption)} />
      <span className="assumption-note">
        <span>{origin.origin}</span>
        {origin.note ? `: ${origin.note}` : ''}
      </span>
    </>
  );
  return assumption.owner ? (
    <button type="button" onClick={() => jumpTo(assumption)}>
      {content}
    </button>
  ) : (
    <div className="assumption-plain">{content}</div>
  );
}
