import { useEffect, useMemo, useRef, useState } from 'react';
import {
  type ComparedRow,
  comparedText,
  compareStates,
  passingInBoth,
  type StateNumbers,
} from '../../checks/index.ts';
import { type ComparedCases, useWorkbench, workbench } from '../../store/index.ts';
import type { Study } from '../../study/index.ts';
import type { CaseDossier } from '../../worker/index.ts';
import { CompareDrawings } from './CompareDrawings.tsx';
import { CompareHead } from './CompareHead.tsx';
import { CompareSide } from './CompareSide.tsx';
import { CompareTable } from './CompareTable.tsx';
import { comparableStates } from './comparisonFrom.ts';
import { stateOf } from './stateOf.ts';
import { useComparison } from './useComparison.ts';
import './compare.css';

function close(): void {
  workbench.getState().compareCases(null);
}

function numbersOf(study: Study, { caseId, solution, verdicts, scans }: CaseDossier): StateNumbers {
  return { study: stateOf(study, caseId), solution, verdicts, scan: scans[0]?.with ?? null };
}

/** Two operating states side by side, over the paper: numbers, verdicts, impedance, data, drawings. */
export function Compare({ study, compared }: { study: Study; compared: ComparedCases }) {
  const sheet = useRef<HTMLElement>(null);
  const setCompared = useWorkbench((state) => state.compareCases);
  const comparison = useComparison(study, compared);
  const [shown, setShown] = useState<'numbers' | 'drawings'>('numbers');
  const [onlyDiffering, setOnlyDiffering] = useState(true);
  useEffect(() => {
    const before = document.activeElement;
    sheet.current?.querySelector<HTMLElement>('select')?.focus();
    return () => {
      if (before instanceof HTMLElement || before instanceof SVGElement)
        before.focus({ preventScroll: true });
    };
  }, []);
  const { a, b, study: solved } = comparison;
  const rows = useMemo(
    () => (a && b && solved ? compareStates(solved, numbersOf(solved, a), numbersOf(solved, b)) : []),
    [a, b, solved],
  );
  const states = comparableStates(study);
  const nameOf = (id: string) => states.find((state) => state.id === id)?.name ?? id;
  const names = { a: nameOf(compared.a), b: nameOf(compared.b) };
  const listed = onlyDiffering ? rows.filter(({ change }) => change > 0) : rows;
  const onKeyDown = (event: React.KeyboardEvent) => {
    if (event.key !== 'Escape' || event.defaultPrevented) return;
    event.stopPropagation();
    close();
  };
  return (
    <section
      ref={sheet}
      className={comparison.stale ? 'compare stale' : 'compare'}
      aria-label={`${names.a} beside ${names.b}`}
      onKeyDown={onKeyDown}
    >
      <CompareHead
        states={states}
        compared={compared}
        onCompared={setCompared}
        shown={shown}
        onShown={setShown}
        onlyDiffering={onlyDiffering}
        onOnlyDiffering={setOnlyDiffering}
        text={() => comparedText(listed, names.a, names.b)}
        onClose={close}
      />
      {a && b && solved ? (
        <CompareBody
          {...{ study: solved, a, b, names, shown, listed }}
          hidden={rows.length - listed.length}
        />
      ) : (
        <p className="compare-waiting" role="status">
          {comparison.words}
        </p>
      )}
      {comparison.stale && a && <span className="solving">solving</span>}
    </section>
  );
}

interface BodyProps {
  study: Study;
  a: CaseDossier;
  b: CaseDossier;
  names: { a: string; b: string };
  shown: 'numbers' | 'drawings';
  listed: readonly ComparedRow[];
  hidden: number;
}

function CompareBody({ study, a, b, names, shown, listed, hidden }: BodyProps) {
  if (shown === 'drawings') return <CompareDrawings study={study} a={a} b={b} names={names} />;
  return (
    <div className="compare-numbers">
      <CompareTable
        rows={listed}
        names={names}
        hidden={hidden}
        passing={passingInBoth(a.verdicts, b.verdicts)}
      />
      <CompareSide study={study} a={a} b={b} names={names} />
    </div>
  );
}
