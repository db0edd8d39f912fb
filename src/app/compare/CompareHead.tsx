import type { ComparedCases } from '../../store/index.ts';

interface Props {
  states: readonly { id: string; name: string }[];
  compared: ComparedCases;
  onCompared(compared: ComparedCases): void;
  shown: 'numbers' | 'drawings';
  onShown(shown: 'numbers' | 'drawings'): void;
  onlyDiffering: boolean;
  onOnlyDiffering(only: boolean): void;
  /** The listed rows as tab-separated text. */
  text(): string;
  onClose(): void;
}

/** Which two states, what of them, and the way out. */
export function CompareHead(props: Props) {
  const { states, compared, onCompared, shown, onShown } = props;
  const choice = (side: 'a' | 'b') => (
    <label className="compare-choice">
      <b aria-hidden="true">{side.toUpperCase()}</b>
      <span className="visually-hidden">{side === 'a' ? 'First state' : 'Second state'}</span>
      <select
        value={compared[side]}
        onChange={(event) => onCompared({ ...compared, [side]: event.target.value })}
      >
        {states.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </select>
    </label>
  );
  return (
    <header className="compare-head">
      {choice('a')}
      <button
        type="button"
        className="small-button"
        title="Exchange the two"
        aria-label="Exchange the two"
        onClick={() => onCompared({ a: compared.b, b: compared.a })}
      >
        ⇄
      </button>
      {choice('b')}
      <fieldset className="compare-views">
        <legend className="visually-hidden">What is shown</legend>
        {(['numbers', 'drawings'] as const).map((view) => (
          <button key={view} type="button" aria-pressed={shown === view} onClick={() => onShown(view)}>
            {view}
          </button>
        ))}
      </fieldset>
      {shown === 'numbers' && (
        <>
          <label className="compare-only">
            <input
              type="checkbox"
              checked={props.onlyDiffering}
              onChange={(event) => props.onOnlyDiffering(event.target.checked)}
            />
            only what differs
          </label>
          <button
            type="button"
            className="small-button"
            title="The rows listed, tab-separated"
            onClick={() => void navigator.clipboard.writeText(props.text())}
          >
            copy table
          </button>
        </>
      )}
      <button
        type="button"
        className="small-button compare-close"
        title="Back to the drawing (Escape)"
        onClick={props.onClose}
      >
        close
      </button>
    </header>
  );
}
