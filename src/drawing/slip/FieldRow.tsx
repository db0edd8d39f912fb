import type { ReactNode } from 'react';
import type { DataOrigin, Field, Finding } from '../../study/index.ts';
import { Formula } from './Formula.tsx';
import { OriginField } from './OriginField.tsx';

export interface FieldRowProps {
  id: string;
  field: Field;
  unit: string;
  /** Range and typical values in few words. */
  hint: string;
  /** Wide controls stand below their label. */
  wide: boolean;
  findings: readonly Finding[];
  origin?: DataOrigin | undefined;
  /** Absent where an origin makes no sense. */
  onOrigin?: ((origin: DataOrigin | null) => void) | undefined;
  onFocusOrigin(): void;
  /** What the case or the base study says otherwise. */
  remark?: ReactNode;
  children: ReactNode;
}

/** One line of the nameplate: label and hint, value, unit, origin mark; findings and remarks below. */
export function FieldRow(props: FieldRowProps) {
  const { id, field, unit, hint, wide, findings, origin, onOrigin, remark, children } = props;
  const title = field.typical ? `${field.help}\nTypical: ${field.typical}` : field.help;
  return (
    <div className={wide ? 'slip-row slip-row-wide' : 'slip-row'}>
      <label htmlFor={id} title={title}>
        <Formula text={field.label} />
      </label>
      {hint !== '' && <span className="slip-hint">{hint}</span>}
      <div className="slip-value">{children}</div>
      <span className="slip-unit">{unit}</span>
      {onOrigin && (
        <OriginField
          id={`${id}-came-from`}
          label={field.label}
          origin={origin}
          onChange={onOrigin}
          onFocus={props.onFocusOrigin}
        />
      )}
      <span id={`${id}-help`} className="slip-hidden">
        {hint === '' ? title : `${hint}. ${title}`}
      </span>
      {remark && <div className="slip-remark">{remark}</div>}
      {findings.map((finding) => (
        <FindingLine key={finding.code + finding.path} finding={finding} />
      ))}
    </div>
  );
}

/** What is said about the value; the slip already names the part, so its name is left out. */
export function FindingLine({ finding }: { finding: Finding }) {
  const text = finding.message.replace(/^[^:]{1,60}: /, '');
  return (
    <p className="slip-finding" data-severity={finding.severity}>
      <span aria-hidden="true">{finding.severity === 'error' ? '✕' : '!'}</span>{' '}
      {text.charAt(0).toUpperCase() + text.slice(1)}
      {finding.mend && ` ${finding.mend}`}
    </p>
  );
}
