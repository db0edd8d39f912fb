import type { DataOrigin } from '../../study/index.ts';
import { TextInput } from './TextInput.tsx';

export interface OriginDetailProps {
  id: string;
  label: string;
  origin: DataOrigin;
  onChange(origin: DataOrigin): void;
}

const isoDate = /^\d{4}(-\d{2}(-\d{2})?)?$/;

/** When and by whom a value was measured or read: shown while the origin mark or this line has the focus. */
export function OriginDetail({ id, label, origin, onChange }: OriginDetailProps) {
  const change = (key: 'date' | 'note', text: string) => {
    const { [key]: _old, ...rest } = origin;
    onChange(text === '' ? rest : { ...rest, [key]: text });
    return null;
  };
  return (
    <div className="slip-origin-detail">
      <span className="slip-unit">{origin.origin}</span>
      <TextInput
        id={`${id}-date`}
        label={`Date of ${label}`}
        placeholder="2026-01-31"
        value={origin.date ?? ''}
        onCommit={(text) =>
          text === '' || isoDate.test(text)
            ? change('date', text)
            : `"${text}" is no date; write year-month-day, as in 2026-01-31.`
        }
      />
      <TextInput
        id={`${id}-note`}
        label={`Note on ${label}`}
        placeholder="source, note"
        value={origin.note ?? ''}
        onCommit={(text) => change('note', text)}
      />
    </div>
  );
}
