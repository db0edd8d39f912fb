import { useState } from 'react';
import type { DataOrigin } from '../../study/index.ts';
import { OriginDetail } from './OriginDetail.tsx';
import { OriginMark } from './OriginMark.tsx';

export interface OriginFieldProps {
  id: string;
  label: string;
  origin: DataOrigin | undefined;
  onChange(origin: DataOrigin | null): void;
  onFocus(): void;
}

/** Where a value comes from: its mark, and date and note while the focus is on the mark or on them. */
export function OriginField({ id, label, origin, onChange, onFocus }: OriginFieldProps) {
  const [open, setOpen] = useState(false);
  return (
    <fieldset
      className="slip-origin-field"
      aria-label={`Origin of ${label}`}
      onFocus={() => {
        setOpen(true);
        onFocus();
      }}
      onBlur={({ currentTarget, relatedTarget }) => {
        if (!currentTarget.contains(relatedTarget)) setOpen(false);
      }}
    >
      <OriginMark id={id} label={label} origin={origin} onChange={onChange} />
      {origin && open && <OriginDetail id={id} label={label} origin={origin} onChange={onChange} />}
    </fieldset>
  );
}
