import { type FocusEvent, useEffect, useMemo, useRef, useState } from 'react';
import type { Verdict, VerdictWord } from '../../checks/index.ts';
import { useMeasuredSize } from '../figure/useMeasuredSize.ts';
import { columnActions } from './columnActions.ts';
import { columnHandlers, focusNote } from './columnHandlers.ts';
import { NoteMenu } from './NoteMenu.tsx';
import type { NotesColumnProps } from './NotesColumnProps.ts';
import { NotesHead } from './NotesHead.tsx';
import { type NoteSubject, pinKey, pinSubject, subjectKey } from './noteLetters.ts';
import { openReadings, openVerdicts } from './openAtFirst.ts';
import type { Reading } from './Reading.ts';
import { ReadingNote } from './ReadingNote.tsx';
import { useLatest } from './useLatest.ts';
import { type NoteDrag, useNoteDrag } from './useNoteDrag.ts';
import { useNoteStates } from './useNoteStates.ts';
import { VerdictRow } from './VerdictRow.tsx';
import { groupedVerdicts, type VerdictGrouping, verdictCounts } from './verdictOrder.ts';

const FIRST_SHOWN: ReadonlySet<VerdictWord> = new Set(['fail', 'watch', 'unknown']);

const FIRST_SIZE = { width: 320, height: 640 };
/** From this width on readings and verdicts stand side by side, as the style sheet has it. */
const BESIDE = 580;

/** The notes column: pinned readings first, then verdicts; every note tied to its part by a letter. */
export function NotesColumn(props: NotesColumnProps) {
  const { readings, verdicts, nameOf, caseNameOf, everyCase = false } = props;
  const [shown, setShown] = useState(FIRST_SHOWN);
  const [chosen, setGrouping] = useState<VerdictGrouping>('margin');
  const grouping = chosen === 'case' && !everyCase ? 'margin' : chosen;
  const [focused, setFocused] = useState<string | null>(null);
  const [menu, setMenu] = useState<{ key: string; anchor: HTMLElement } | null>(null);
  const column = useRef<HTMLElement>(null);
  const size = useMeasuredSize(column, FIRST_SIZE);
  const counts = useMemo(() => verdictCounts(verdicts), [verdicts]);
  const groups = useMemo(
    () =>
      groupedVerdicts(verdicts, shown, grouping, {
        subject: (verdict) => nameOf(verdict.subject),
        case: ({ caseId }) => caseNameOf?.(caseId) ?? caseId,
      }),
    [verdicts, shown, grouping, nameOf, caseNameOf],
  );
  const listed = groups.flatMap((group) => group.verdicts);
  const readingKeys = readings.map((one) => pinKey(one.pin));
  const keys = [...readingKeys, ...listed.map((one) => one.key)];
  const tabStop = focused !== null && keys.includes(focused) ? focused : (keys[0] ?? null);
  const opened = new Set([
    ...readingKeys.slice(0, openReadings(size.height)),
    ...openVerdicts(listed, size.width >= BESIDE),
  ]);
  const states = useNoteStates(
    (key) => (opened.has(key) ? 'card' : 'line'),
    (key) => (key.startsWith('voltage') ? 'spectrum' : 'course'),
  );

  const { actionsOf, moveReading } = columnActions(props, listed, states);
  const { drag, handlersOf } = useNoteDrag(column, readingKeys, moveReading);
  const letterOf = (subject: NoteSubject) => props.letters.get(subjectKey(subject)) ?? '';

  const live = useLatest({
    keys,
    actionsOf,
    setFocused,
    toggle: (key: string) => {
      states.toggle(key);
      const opened = listed.find((verdict) => verdict.key === key);
      if (opened) props.onOpen?.(opened);
    },
    openMenu: (key: string, anchor: HTMLElement) => setMenu({ key, anchor }),
    onSubject: props.onSubject,
  });
  const handlers = useMemo(() => columnHandlers(live, column), [live]);
  const isLit = (subject: NoteSubject) =>
    props.litSubject ? subjectKey(props.litSubject) === subjectKey(subject) : false;
  useFirstNote(column, props.firstNote ?? null, states.open);

  const readingNote = (reading: Reading) => {
    const key = pinKey(reading.pin);
    const subject = pinSubject(reading.pin);
    return (
      <ReadingNote
        key={key}
        reading={reading}
        letter={letterOf(subject)}
        state={states.stateOf(key)}
        face={states.faceOf(key)}
        lit={isLit(subject)}
        tabStop={key === tabStop}
        dropMark={dropMark(drag, readingKeys, key)}
        drag={props.onReorder && handlersOf(key)}
        order={props.order}
        timeTurn={props.timeTurn}
        onOrder={props.onOrder}
        onTimeTurn={props.onTimeTurn}
        onToggle={() => handlers.toggle(key)}
        onHover={(hovered) => handlers.hover(key, subject, hovered)}
        onFocus={() => handlers.focus(key, subject)}
        onMenu={(anchor) => handlers.menu(key, anchor)}
        onLit={props.onLit && ((lit) => props.onLit?.(lit, reading))}
        onKeyDown={(event) => handlers.press(key, event)}
      />
    );
  };
  const verdictNote = (verdict: Verdict) => (
    <VerdictRow
      key={verdict.key}
      verdict={verdict}
      subjectName={nameOf(verdict.subject)}
      letter={letterOf(verdict.subject)}
      caseName={caseNameOf?.(verdict.caseId)}
      namesCase={everyCase}
      worst={props.worstOf?.(verdict)}
      folded={states.stateOf(verdict.key) === 'line'}
      lit={isLit(verdict.subject)}
      tabStop={verdict.key === tabStop}
      handlers={handlers}
      onJump={props.onJump}
      onTry={props.onTry}
      onOrder={props.onOrder}
    />
  );
  const leave = (event: FocusEvent) => {
    if (!event.currentTarget.contains(event.relatedTarget)) props.onSubject?.(null, null);
  };
  return (
    <section ref={column} className={props.stale ? 'notes stale' : 'notes'} aria-label="Notes" onBlur={leave}>
      <NotesHead
        counts={counts}
        shown={shown}
        grouping={grouping}
        everyCase={everyCase}
        onShown={setShown}
        onGrouping={setGrouping}
        onFold={props.onFold}
      />
      <div className="notes-list">
        <div className="notes-readings">
          {readings.map(readingNote)}
          {readings.length === 0 && (
            <p className="chart-hint">
              Nothing is watched yet. Open a busbar or a part and pin its voltage or current: its phasors,
              waveform and spectrum stand here.
            </p>
          )}
        </div>
        <div className="notes-verdicts">
          {everyCase && (
            <p className="notes-scope">
              Verdicts of every case
              <button type="button" onClick={props.onThisCase}>
                this case alone
              </button>
            </p>
          )}
          {groups.map((group) => (
            <div key={group.title} className="notes-group">
              {group.title && <h3>{group.title}</h3>}
              {group.verdicts.map(verdictNote)}
            </div>
          ))}
          {listed.length === 0 && <p className="chart-hint">{emptyWords(counts, props.judging ?? false)}</p>}
        </div>
      </div>
      {menu && (
        <NoteMenu
          name="What can be done with this note"
          actions={actionsOf(menu.key)}
          anchor={menu.anchor}
          onClose={() => setMenu(null)}
        />
      )}
    </section>
  );
}

/** Opens a note chosen before the column was there and gives it the keyboard. */
function useFirstNote(
  column: React.RefObject<HTMLElement | null>,
  key: string | null,
  open: (key: string) => void,
) {
  const opening = useLatest(open);
  useEffect(() => {
    if (key === null) return;
    opening.current(key);
    focusNote(column.current, key);
  }, [key, column, opening]);
}

function dropMark(drag: NoteDrag | null, keys: readonly string[], key: string) {
  if (!drag) return undefined;
  if (drag.key === key) return 'dragged';
  if (drag.by === 0 || keys.indexOf(drag.key) + drag.by !== keys.indexOf(key)) return undefined;
  return drag.by < 0 ? 'drop-before' : 'drop-after';
}

function emptyWords(counts: Record<VerdictWord, number>, judging: boolean): string {
  const { pass, ...others } = counts;
  const left = Object.values(others).reduce((sum, count) => sum + count, 0);
  if (pass + left === 0 && judging) return 'Judging this case.';
  if (pass + left === 0)
    return 'Verdicts appear here as soon as a supply feeds something to judge: a bank, a drive, a busbar with a limit.';
  if (left === 0) return `All ${pass} checks pass. The ✓ above lists them.`;
  return 'No verdict of the kinds chosen above.';
}
