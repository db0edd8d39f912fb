import {
  addSpectrum,
  builtInSpectra,
  builtInSpectrum,
  type Edit,
  formatNumber,
  type HarmonicRow,
  joinEdits,
  nameOf,
  type Study,
  spectrumById,
  spectrumOf,
  updateSpectrum,
} from '../../study/index.ts';
import { RowsTable } from './RowsTable.tsx';
import { TextInput } from './TextInput.tsx';

export interface SpectrumInputProps {
  id: string;
  study: Study;
  value: string | readonly HarmonicRow[];
  describedBy: string;
  onFocus(): void;
  /** Sets the part's reference or rows. */
  onCommit(value: string | HarmonicRow[]): string | null;
  /** The edit that would set the part's reference, made on a study that already has the spectrum. */
  setReference?: ((study: Study, spectrumId: string) => Edit) | undefined;
  /** Takes an edit of the study's spectra. */
  onEdit(edit: Edit): string | null;
}

const ownRows = '\u0000rows';

/** Which spectrum a converter draws: built in, one of the study's, or rows of its own, and its rows to edit. */
export function SpectrumInput(props: SpectrumInputProps) {
  const { id, study, value, onFocus, onCommit } = props;
  const named = typeof value === 'string' ? spectrumById(study, value) : undefined;
  const builtIn = typeof value === 'string' ? builtInSpectrum(value) : undefined;
  const rows =
    typeof value !== 'string' ? value : builtIn ? copied(spectrumOf(study, value)) : (named?.orders ?? []);
  const users =
    named && !builtIn
      ? study.elements.filter((element) => element.kind === 'converter' && element.spectrum === named.id)
          .length
      : 0;
  const { setReference } = props;
  const share = () => {
    if (!setReference) return;
    const added = addSpectrum(study, { orders: [...rows] });
    props.onEdit(
      joinEdits('spectrum.share', 'share the rows as a spectrum of the study', [
        () => added,
        (current) => setReference(current, added.spectrumId),
      ]),
    );
  };
  return (
    <div className="slip-spectrum">
      <select
        id={id}
        aria-describedby={props.describedBy}
        value={typeof value === 'string' ? value : ownRows}
        onFocus={onFocus}
        onChange={(event) => onCommit(event.target.value === ownRows ? [...rows] : event.target.value)}
      >
        <option value={ownRows}>rows of its own</option>
        {(study.spectra ?? []).length > 0 && (
          <optgroup label="of this study">
            {study.spectra?.map((spectrum) => (
              <option key={spectrum.id} value={spectrum.id}>
                {nameOf(spectrum)}
              </option>
            ))}
          </optgroup>
        )}
        <optgroup label="built in">
          {builtInSpectra.map((spectrum) => (
            <option key={spectrum.id} value={spectrum.id}>
              {spectrum.name}
            </option>
          ))}
        </optgroup>
      </select>
      {builtIn ? (
        <>
          <p className="slip-summary">
            {rowsText(rows)}
            <br />
            {builtIn.origin}
            {builtIn.anglesKnown ? '' : '; angles unknown'}
          </p>
          <button type="button" className="slip-small" onClick={() => onCommit([...rows])}>
            Edit a copy of these rows
          </button>
        </>
      ) : (
        <>
          {named && (
            <SharedSpectrum
              {...props}
              spectrumId={named.id}
              name={named.name ?? ''}
              origin={named.origin ?? ''}
              users={users}
            />
          )}
          <RowsTable
            id={`${id}-rows`}
            caption={named ? `Rows of ${nameOf(named)}` : 'Rows of its own'}
            rows={rows}
            onFocus={onFocus}
            onCommit={(next) =>
              named ? props.onEdit(updateSpectrum(study, named.id, { orders: next })) : onCommit(next)
            }
          />
          {!named && setReference && (
            <button type="button" className="slip-small" onClick={share}>
              Share as a spectrum of the study
            </button>
          )}
        </>
      )}
    </div>
  );
}

interface SharedSpectrumProps extends SpectrumInputProps {
  spectrumId: string;
  name: string;
  origin: string;
  users: number;
}

function SharedSpectrum({ id, study, spectrumId, name, origin, users, onEdit }: SharedSpectrumProps) {
  return (
    <>
      <p className="slip-summary">
        used by {users === 1 ? 'this part' : `${users} parts`}; a change reaches all of them
      </p>
      <TextInput
        id={`${id}-name`}
        label="Name of the spectrum"
        value={name}
        placeholder="name"
        onCommit={(text) => onEdit(updateSpectrum(study, spectrumId, { name: text || undefined }))}
      />
      <TextInput
        id={`${id}-origin`}
        label="Origin of the spectrum"
        value={origin}
        placeholder="origin: who measured it, when, at what load"
        onCommit={(text) => onEdit(updateSpectrum(study, spectrumId, { origin: text || undefined }))}
      />
    </>
  );
}

/** The first rows in words: "5: 40 %, 7: 16 % …". */
function rowsText(rows: readonly HarmonicRow[]): string {
  const first = rows.slice(0, 6).map((row) => `${row.h}: ${formatNumber(row.percent, { digits: 3 })} %`);
  return `${first.join(', ')}${rows.length > 6 ? ' …' : ''}`;
}

/** A copy to be edited: cut at the study's highest order, six digits of a computed percentage. */
function copied(rows: readonly HarmonicRow[]): HarmonicRow[] {
  return rows.map((row) => ({ ...row, percent: Number(row.percent.toPrecision(6)) }));
}
