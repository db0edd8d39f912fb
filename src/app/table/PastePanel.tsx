import { useEffect, useId, useMemo, useRef, useState } from 'react';
import {
  counted,
  type DataOrigin,
  type Edit,
  nameOf,
  type Paste,
  type PasteChoices,
  type PastedRow,
  type PastePlace,
  readPaste,
  type Study,
  type TableOwner,
  tablePaste,
} from '../../study/index.ts';
import { ownerWords } from './cellEdits.ts';
import { PasteTable } from './PasteTable.tsx';

export interface PastePanelProps {
  study: Study;
  owner: TableOwner;
  text: string;
  place: PastePlace;
  /** Parts that stand are changed in this case alone. */
  caseId: string | undefined;
  caseName: string | undefined;
  onEdit(edit: Edit): void;
  onClose(): void;
}

const originWords: readonly DataOrigin['origin'][] = ['nameplate', 'measured', 'typical', 'assumed'];

/** "paste 12 motors: 10 new, 2 changed". */
function undoWords(owner: TableOwner, rows: readonly PastedRow[]): string {
  const fresh = rows.filter(({ fate }) => fate === 'new').length;
  const changed = rows.length - fresh;
  const parts = [fresh > 0 && `${fresh} new`, changed > 0 && `${changed} changed`].filter(Boolean);
  return `paste ${rows.length} ${ownerWords(owner)}: ${parts.join(', ')}`;
}

/** A pasted table before it is taken: what is understood on its own rows, each guess to be changed. */
export function PastePanel(props: PastePanelProps) {
  const { study, owner, caseId, onEdit, onClose } = props;
  const id = useId();
  const [text, setText] = useState(props.text);
  const [choices, setChoices] = useState<PasteChoices>({});
  const [bus, setBus] = useState(props.place.bus);
  const [origin, setOrigin] = useState<DataOrigin['origin'] | ''>('');
  const panel = useRef<HTMLElement>(null);
  useEffect(() => panel.current?.querySelector<HTMLElement>('textarea, .paste-take')?.focus(), []);
  const place = useMemo(() => ({ ...props.place, bus }), [props.place, bus]);
  const paste = useMemo(
    () => readPaste(study, owner, text, place, choices),
    [study, owner, text, place, choices],
  );
  const { edit, rows, errors } = useMemo(
    () =>
      tablePaste(study, owner, paste, {
        words: (taken) => undoWords(owner, taken),
        place: bus,
        caseId,
        ...(origin === '' ? {} : { origin: { origin } }),
      }),
    [study, owner, paste, bus, caseId, origin],
  );
  const change = (next: PasteChoices) => setChoices({ ...choices, ...next });
  const take = () => {
    if (edit) onEdit(edit);
    onClose();
  };
  return (
    <section
      ref={panel}
      className="paste-panel"
      aria-label="Paste from a sheet"
      onKeyDown={(event) => {
        if (event.key !== 'Escape') return;
        event.preventDefault();
        event.stopPropagation();
        onClose();
      }}
    >
      <header>
        <h2>{ownerWords(owner)} from a sheet</h2>
        {text.trim() === '' ? (
          <p className="unit">Copy cells in the spreadsheet, heads included, and paste them here.</p>
        ) : (
          <Understood paste={paste} rows={rows} caseName={props.caseName} />
        )}
      </header>
      {text.trim() === '' ? (
        <textarea
          aria-label="Cells copied from a sheet"
          spellCheck={false}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      ) : (
        <>
          <Guesses {...{ id, study, owner, paste, bus, origin, change, setBus, setOrigin }} />
          <PasteTable
            owner={owner}
            paste={paste}
            rows={rows}
            onColumn={(index, key) => change({ columns: { ...choices.columns, [index]: key } })}
            onCell={(line, index, cell) =>
              change({ cells: { ...choices.cells, [`${line} ${index}`]: cell } })
            }
            onUse={(line, use) => {
              const without = new Set(choices.without);
              if (use) without.delete(line);
              else without.add(line);
              change({ without });
            }}
          />
        </>
      )}
      {errors.map((error) => (
        <p key={error} className="slip-error" role="alert">
          {error}
        </p>
      ))}
      <footer>
        <button type="button" className="plain-button paste-take" disabled={!edit} onClick={take}>
          {takeWords(rows)}
        </button>
        <button type="button" className="plain-button" onClick={onClose}>
          Cancel
        </button>
      </footer>
    </section>
  );
}

/** What the button does, with what it leaves out. */
function takeWords(rows: readonly PastedRow[]): string {
  const taken = rows.filter(({ fate }) => fate === 'new' || fate === 'change');
  const wrong = taken.flatMap(({ cells }) => cells).filter(({ error }) => error !== null).length;
  const lost = rows.filter(({ fate }) => fate === 'refused').length;
  const without = [
    wrong > 0 && counted(wrong, 'value that cannot be read', 'values that cannot be read'),
    lost > 0 && counted(lost, 'refused row'),
  ].filter(Boolean);
  return `Take ${counted(taken.length, 'row')}${without.length > 0 ? ` without ${without.join(' and ')}` : ''}`;
}

const separators: Readonly<Record<string, string>> = { '\t': 'tabs', ';': 'semicolons', ',': 'commas' };

interface UnderstoodProps {
  paste: Paste;
  rows: readonly PastedRow[];
  caseName: string | undefined;
}

/** One sentence on what was found: rows and what becomes of them, heads, units, decimal mark, what is left out. */
function Understood({ paste, rows, caseName }: UnderstoodProps) {
  const count = (fate: PastedRow['fate']) => rows.filter((row) => row.fate === fate).length;
  const fates = [
    count('new') > 0 && `${count('new')} new`,
    count('change') > 0 && `${count('change')} changed`,
    count('same') > 0 && `${count('same')} already so`,
    count('left out') > 0 && `${count('left out')} left out`,
    count('refused') > 0 && `${count('refused')} refused`,
  ].filter(Boolean);
  const unused = paste.columns.filter(({ column }) => column === null);
  const outside = unused.map(({ head }, index) => head || `column ${index + 1}`);
  return (
    <p role="status">
      {counted(rows.length, 'row')}: {fates.join(', ') || 'none'}.{' '}
      {paste.separator === null ? 'One column' : `Cells parted by ${separators[paste.separator]}`}
      {paste.header ? ', heads in the first row' : ', no heads'}
      {paste.unitRow ? ', units in the second' : ''}
      {paste.blank > 0 ? `, ${counted(paste.blank, 'blank line')} passed over` : ''}.{' '}
      {unused.length > 0 && <b>Left out: {outside.join(', ')}. </b>}
      {paste.mark.mixed && <b>Decimal points and commas are both in use; each number is read by itself. </b>}
      {paste.mark.guessed && <b>Whether commas and points part thousands or decimals is a guess. </b>}
      Empty cells leave a value as it is.
      {caseName !== undefined && ` Changes go to ${caseName}; new parts to the base study.`}
    </p>
  );
}

interface GuessesProps {
  id: string;
  study: Study;
  owner: TableOwner;
  paste: Paste;
  bus: string | undefined;
  origin: DataOrigin['origin'] | '';
  change(next: PasteChoices): void;
  setBus(bus: string): void;
  setOrigin(origin: DataOrigin['origin'] | ''): void;
}

/** Guesses that hold for the whole table. */
function Guesses({ id, study, owner, paste, bus, origin, change, setBus, setOrigin }: GuessesProps) {
  const hasPlace = paste.columns.some(({ column }) => column?.key === 'bus' || column?.key === 'from');
  return (
    <div className="paste-guesses">
      <label className="slip-check">
        <input
          type="checkbox"
          checked={paste.header}
          onChange={(event) => change({ header: event.target.checked, columns: {} })}
        />
        first row is heads
      </label>
      <label htmlFor={`${id}-mark`}>decimals</label>
      <select
        id={`${id}-mark`}
        value={paste.mark.used ?? ''}
        onChange={({ target }) =>
          change({ decimal: target.value === '.' || target.value === ',' ? target.value : undefined })
        }
      >
        <option value="">each by itself</option>
        <option value=".">1,234.5 with a point</option>
        <option value=",">1.234,5 with a comma</option>
      </select>
      {owner !== 'bus' && !hasPlace && (
        <>
          <label htmlFor={`${id}-bus`}>new ones at</label>
          <select id={`${id}-bus`} value={bus ?? ''} onChange={(event) => setBus(event.target.value)}>
            {bus === undefined && <option value="">choose</option>}
            {study.buses.map((one) => (
              <option key={one.id} value={one.id}>
                {nameOf(one)}
              </option>
            ))}
          </select>
        </>
      )}
      <label htmlFor={`${id}-origin`}>values are</label>
      <select
        id={`${id}-origin`}
        value={origin}
        onChange={(event) => setOrigin(originWords.find((word) => word === event.target.value) ?? '')}
      >
        <option value="">of no stated origin</option>
        {originWords.map((word) => (
          <option key={word} value={word}>
            {word}
          </option>
        ))}
      </select>
    </div>
  );
}
