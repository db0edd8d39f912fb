import type { Verdict } from '../../checks/index.ts';
import { movedPin } from './movedPin.ts';
import type { NotesColumnProps } from './NotesColumnProps.ts';
import { type NoteActions, readingActions, verdictActions } from './noteActions.ts';
import { pinKey, pinSubject, subjectKey } from './noteLetters.ts';
import { readingText, verdictText } from './noteText.ts';
import type { Reading } from './Reading.ts';
import type { NoteStates } from './useNoteStates.ts';

/** What can be done with each note of the column, by its key, and the move that dragging shares with the keys. */
export function columnActions(props: NotesColumnProps, listed: readonly Verdict[], states: NoteStates) {
  const { readings, nameOf, onReorder, onUnpin, onPicture, onJump, onOrder, onCopy } = props;
  const readingKeys = readings.map((one) => pinKey(one.pin));
  const moveReading = (key: string, by: number) => {
    const pins = readings.map((one) => one.pin);
    const moved = movedPin(pins, readingKeys.indexOf(key), by);
    if (moved) onReorder?.(moved);
  };
  const ofReading = (reading: Reading, key: string) =>
    readingActions({
      lens: states.stateOf(key) === 'lens',
      folded: states.stateOf(key) === 'line',
      otherFace: states.faceOf(key) === 'course' ? 'spectrum' : 'course',
      first: readingKeys[0] === key,
      last: readingKeys.at(-1) === key,
      onFold: () => states.toggle(key),
      onWiden: () => {
        // The leader of a card would cross the lens.
        props.onSubject?.(null, null);
        states.widen(key);
      },
      onFace: () => states.turn(key),
      onMove: onReorder && ((by) => moveReading(key, by)),
      onUnpin: onUnpin && (() => onUnpin(reading.pin)),
      onCopy: () =>
        onCopy?.(readingText(reading, props.letters.get(subjectKey(pinSubject(reading.pin))) ?? '')),
      onPicture:
        reading.absent === undefined && onPicture
          ? (picture, way) => onPicture(reading, picture, way)
          : undefined,
    });
  const ofVerdict = (verdict: Verdict) =>
    verdictActions({
      folded: states.stateOf(verdict.key) === 'line',
      order: verdict.order,
      onFold: () => states.toggle(verdict.key),
      onJump: onJump && (() => onJump(verdict)),
      onOrder: onOrder && (() => verdict.order !== undefined && onOrder(verdict.order)),
      onCopy: () =>
        onCopy?.(verdictText(verdict, nameOf(verdict.subject), props.caseNameOf?.(verdict.caseId))),
    });
  const actionsOf = (key: string): NoteActions => {
    const reading = readings.find((one) => pinKey(one.pin) === key);
    if (reading) return ofReading(reading, key);
    const verdict = listed.find((one) => one.key === key);
    return verdict ? ofVerdict(verdict) : [];
  };
  return { actionsOf, moveReading };
}
