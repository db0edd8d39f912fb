import { type KeyboardEvent, useMemo, useRef, useState } from 'react';
import type { Verdict, VerdictWord } from '../../checks/index.ts';
import type { Pin } from '../../study/index.ts';
import type { LitPhasor } from '../phasor/PhasorDrawing.tsx';
import { columnHandlers } from './columnHandlers.ts';
import { movedPin } from './movedPin.ts';
import type { NoteState } from './NoteFrame.tsx';
import { NotesFilter } from './NotesFilter.tsx';
import { type NoteSubject, pinKey, pinSubject, subjectKey } from './noteLetters.ts';
import type { Reading } from './Reading.ts';
import { ReadingNote } from './ReadingNote.tsx';
import { useLatest } from './useLatest.ts';
import { type NoteDrag, useNoteDrag } from './useNoteDrag.ts';
import { VerdictRow } from './VerdictRow.tsx';
import { groupedVerdicts, type VerdictGrouping, verdictCounts } from './verdictOrder.ts';

export interface NotesColumnProps {
  readings: readonly Reading[];
  verdicts: readonly Verdict[];
  /** Letters by `subjectKey`, from `noteLetters`. */
  letters: ReadonlyMap<string, string>;
  nameOf(subject: NoteSubject): string;
  caseNameOf?(caseId: string): string;
  /** Subject lit elsewhere (hovered or selected on the drawing). */
  litSubject?: NoteSubject | null;
  order: number;
  timeTurn: number;
  /** Results belong to an earlier state of the study. */
  stale: boolean;
  onOrder?(order: number): void;
  onTimeTurn?(timeTurn: number): void;
  /** A note is hovered or focused; null when none is. For the leader and the light on the part. */
  onSubject?(subject: NoteSubject | null, noteKey: string | null): void;
  onJump?(verdict: Verdict): void;
  onTry?(verdict: Verdict): void;
  onUnpin?(pin: Pin): void;
  /** The pins in a new order. */
  onReorder?(pins: Pin[]): void;
  onCopy?(text: string): void;
  onLit?(lit: LitPhasor | null, reading: Reading): void;
}

const FIRST_SHOWN: ReadonlySet<VerdictWord> = new Set(['fail', 'watch', 'unknown']);

/** The notes column: pinned readings first, then verdicts; every note tied to its part by a letter. */
export function NotesColumn(props: NotesColumnProps) {
  const { readings, verdicts, nameOf } = props;
  const [states, setStates] = useState<ReadonlyMap<string, NoteState>>(new Map());
  const [shown, setShown] = useState(FIRST_SHOWN);
  const [grouping, setGrouping] = useState<VerdictGrouping>('margin');
  const [focused, setFocused] = useState<string | null>(null);
  const column = useRef<HTMLElement>(null);
  const counts = useMemo(() => verdictCounts(verdicts), [verdicts]);
  const groups = useMemo(
    () => groupedVerdicts(verdicts, shown, grouping, (verdict) => nameOf(verdict.subject)),
    [verdicts, shown, grouping, nameOf],
  );
  const listed = groups.flatMap((group) => group.verdicts);
  const keys = [...readings.map((one) => pinKey(one.pin)), ...listed.map((one) => one.key)];
  const tabStop = focused !== null && keys.includes(focused) ? focused : (keys[0] ?? null);
  const firstFail = listed[0]?.verdict === 'fail' ? listed[0].key : null;
  const pinned = new Set(readings.map((one) => pinKey(one.pin)));
  const openFirst = (key: string): NoteState => (pinned.has(key) || key === firstFail ? 'card' : 'line');
  const stateOf = (key: string, otherwise: NoteState) => states.get(key) ?? otherwise;
  const setState = (key: string, state: NoteState) => setStates(new Map(states).set(key, state));

  const live = useLatest({
    keys,
    setFocused,
    toggle: (key: string) => setState(key, stateOf(key, openFirst(key)) === 'line' ? 'card' : 'line'),
    onSubject: props.onSubject,
  });
  const handlers = useMemo(() => columnHandlers(live, column), [live]);
  const isLit = (subject: NoteSubject) =>
    props.litSubject ? subjectKey(props.litSubject) === subjectKey(subject) : false;
  const letterOf = (subject: NoteSubject) => props.letters.get(subjectKey(subject)) ?? '';

  const readingKeys = readings.map((one) => pinKey(one.pin));
  const moveReading = (key: string, by: number) => {
    const moved = movedPin(
      readings.map((one) => one.pin),
      readingKeys.indexOf(key),
      by,
    );
    if (moved) props.onReorder?.(moved);
  };
  const { drag, handlersOf } = useNoteDrag(column, readingKeys, moveReading);

  const onReadingKey = (reading: Reading, event: KeyboardEvent<HTMLElement>) => {
    const key = pinKey(reading.pin);
    if (event.altKey && isVertical(event.key)) moveReading(key, event.key === 'ArrowUp' ? -1 : 1);
    else if (event.key === 'Delete') props.onUnpin?.(reading.pin);
    else {
      handlers.walk(key, event);
      return;
    }
    event.preventDefault();
  };
  const readingNote = (reading: Reading) => {
    const key = pinKey(reading.pin);
    const subject = pinSubject(reading.pin);
    const state = stateOf(key, 'card');
    return (
      <ReadingNote
        key={key}
        reading={reading}
        letter={letterOf(subject)}
        state={state}
        lit={isLit(subject)}
        tabStop={key === tabStop}
        dropMark={dropMark(drag, readingKeys, key)}
        drag={props.onReorder && handlersOf(key)}
        order={props.order}
        timeTurn={props.timeTurn}
        onOrder={props.onOrder}
        onTimeTurn={props.onTimeTurn}
        onCopy={props.onCopy}
        onToggle={() => handlers.toggle(key)}
        onHover={(hovered) => handlers.hover(key, subject, hovered)}
        onFocus={() => handlers.focus(key, subject)}
        onWiden={() => setState(key, state === 'lens' ? 'card' : 'lens')}
        onUnpin={props.onUnpin && (() => props.onUnpin?.(reading.pin))}
        onLit={props.onLit && ((lit) => props.onLit?.(lit, reading))}
        onKeyDown={(event) => onReadingKey(reading, event)}
      />
    );
  };
  const verdictNote = (verdict: Verdict) => (
    <VerdictRow
      key={verdict.key}
      verdict={verdict}
      subjectName={nameOf(verdict.subject)}
      letter={letterOf(verdict.subject)}
      caseName={props.caseNameOf?.(verdict.caseId)}
      folded={stateOf(verdict.key, openFirst(verdict.key)) === 'line'}
      lit={isLit(verdict.subject)}
      tabStop={verdict.key === tabStop}
      handlers={handlers}
      onCopy={props.onCopy}
      onJump={props.onJump}
      onTry={props.onTry}
      onOrder={props.onOrder}
    />
  );
  return (
    <section ref={column} className={props.stale ? 'notes stale' : 'notes'} aria-label="Notes">
      <div className="notes-list">
        {readings.map(readingNote)}
        {readings.length === 0 && (
          <p className="chart-hint">
            No readings pinned. Select a busbar or a part and pin its voltage or current to watch it here.
          </p>
        )}
        <NotesFilter
          counts={counts}
          shown={shown}
          grouping={grouping}
          onShown={setShown}
          onGrouping={setGrouping}
        />
        {groups.map((group) => (
          <div key={group.title} className="notes-group">
            {group.title && <h3>{group.title}</h3>}
            {group.verdicts.map(verdictNote)}
          </div>
        ))}
        {listed.length === 0 && <p className="chart-hint">{emptyWords(verdicts.length)}</p>}
      </div>
    </section>
  );
}

function dropMark(drag: NoteDrag | null, keys: readonly string[], key: string) {
  if (!drag) return undefined;
  if (drag.key === key) return 'dragged';
  if (drag.by === 0 || keys.indexOf(drag.key) + drag.by !== keys.indexOf(key)) return undefined;
  return drag.by < 0 ? 'drop-before' : 'drop-after';
}

function isVertical(key: string): boolean {
  return key === 'ArrowUp' || key === 'ArrowDown';
}

function emptyWords(total: number): string {
  return total === 0
    ? 'No verdicts yet: they appear as soon as the study has a supply and something to judge.'
    : 'No verdict of the chosen kinds. Switch the counts above to list the others.';
}
