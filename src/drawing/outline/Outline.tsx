import { type KeyboardEvent, useMemo, useRef, useState } from 'react';
import type { Verdict } from '../../checks/index.ts';
import { busById, type CaseDifference, elementById, type Study, studyInCase } from '../../study/index.ts';
import { trayNames } from '../gestures/TrayKind.ts';
import {
  differencesByPart,
  nominalVoltage,
  type OutlineNode,
  outlineWords,
  plateInCase,
  siteOutline,
} from '../layout/index.ts';
import { verdictWords, worstVerdicts } from '../readings/worstVerdict.ts';
import { readSubject, type Subject } from '../subject.ts';
import { type OutlineRow, outlineRows } from './outlineRows.ts';

export interface OutlineProps {
  /** The base study; what stands in the case is told. */
  study: Study;
  caseId: string;
  selection: readonly Subject[];
  verdicts: readonly Verdict[];
  onSelect(items: readonly Subject[]): void;
  onFocusBus(bus: string): void;
  onOpenSlip(subject: Subject): void;
}

const MARK = { fail: '✕', watch: '!', unknown: '?', pass: '✓' } as const;

/** The site as a tree: the same parts, the same selection, without a picture. */
export function Outline(props: OutlineProps) {
  const { selection, verdicts } = props;
  const study = useMemo(() => studyInCase(props.study, props.caseId), [props.study, props.caseId]);
  const differences = useMemo(
    () => differencesByPart(props.study, props.caseId),
    [props.study, props.caseId],
  );
  const tree = useMemo(() => siteOutline(study), [study]);
  const worst = useMemo(() => worstVerdicts(verdicts), [verdicts]);
  const [folded, setFolded] = useState<ReadonlySet<Subject>>(new Set());
  const rows = useMemo(() => outlineRows(tree, folded), [tree, folded]);
  const [wished, setWished] = useState<Subject | undefined>();
  const list = useRef<HTMLDivElement>(null);
  const chosen = selection.at(-1);
  const known = (subject: Subject | undefined) => rows.some((row) => row.subject === subject);
  const current = known(wished) ? wished : known(chosen) ? chosen : rows[0]?.subject;

  const fold = (subject: Subject, shut: boolean) => {
    const next = new Set(folded);
    if (shut) next.add(subject);
    else next.delete(subject);
    setFolded(next);
  };
  const choose = (row: OutlineRow) => {
    setWished(row.subject);
    props.onSelect([row.subject]);
    const read = readSubject(row.subject);
    if (read?.kind === 'bus') props.onFocusBus(read.id);
  };
  const goTo = (row: OutlineRow | undefined) => {
    if (!row) return;
    setWished(row.subject);
    list.current?.querySelector<HTMLElement>(`[data-row="${CSS.escape(row.subject)}"]`)?.focus();
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const at = rows.findIndex((row) => row.subject === current);
    const row = rows[at];
    if (!row) return;
    if (event.key === 'ArrowDown') goTo(rows[at + 1]);
    else if (event.key === 'ArrowUp') goTo(rows[at - 1]);
    else if (event.key === 'Home') goTo(rows[0]);
    else if (event.key === 'End') goTo(rows.at(-1));
    else if (event.key === 'ArrowRight' && row.foldable && !row.open) fold(row.subject, false);
    else if (event.key === 'ArrowRight' && row.foldable) goTo(rows[at + 1]);
    else if (event.key === 'ArrowLeft' && row.foldable && row.open) fold(row.subject, true);
    else if (event.key === 'ArrowLeft') goTo(rows.slice(0, at).findLast((r) => r.level < row.level));
    else if (event.key === 'Enter') props.onOpenSlip(row.subject);
    else if (event.key === ' ') choose(row);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div ref={list} className="outline" role="tree" aria-label="Outline of the site">
      {rows.map((row) => {
        const mark = worst.get(row.subject);
        return (
          <div
            key={row.subject}
            data-row={row.subject}
            role="treeitem"
            aria-level={row.level}
            aria-selected={selection.includes(row.subject)}
            aria-expanded={row.foldable ? row.open : undefined}
            tabIndex={row.subject === current ? 0 : -1}
            style={{ paddingLeft: 8 + 14 * (row.level - 1) }}
            onClick={() => choose(row)}
            onKeyDown={onKeyDown}
            onDoubleClick={() => props.onOpenSlip(row.subject)}
          >
            <span className={row.node.kind === 'bus' ? 'outline-bus' : undefined}>
              {outlineWords(study, row.node)}
            </span>
            <span className="outline-plate">{plateOf(study, row.node, differences)}</span>
            {mark && mark !== 'pass' && (
              <span className={`outline-mark ${mark}`}>
                {MARK[mark]} {verdictWords[mark]}
              </span>
            )}
          </div>
        );
      })}
    </div>
  );
}

function plateOf(
  study: Study,
  node: OutlineNode,
  differences: ReadonlyMap<string, readonly CaseDifference[]>,
): string {
  if (node.kind === 'bus') return nominalVoltage(busById(study, node.id)?.nominalV ?? Number.NaN);
  const part = elementById(study, node.id);
  if (!part) return '';
  return `${trayNames[part.kind]} · ${plateInCase(part, study, differences.get(part.id) ?? [])}`;
}
