export type FlagSeverity = 'error' | 'warning' | 'note';

/** Size of the flag, px. */
export const FLAG = { width: 14, height: 16 };

/**
 * A finding's mark: a flag, as one sticks on a drawing; filled for an error, open with a stroke in it for a warning,
 * open and empty for a remark. No verdict has this shape.
 */
export function FlagShape({ severity, ink }: { severity: FlagSeverity; ink: string }) {
  return (
    <>
      <path d="M2 15V1.5" stroke={ink} strokeWidth={1.5} fill="none" />
      <path
        d="M2 2H12.5L9.5 5.75L12.5 9.5H2Z"
        stroke={ink}
        strokeWidth={1.3}
        strokeLinejoin="round"
        fill={severity === 'error' ? ink : 'none'}
      />
      {severity === 'warning' && <path d="M5.5 3.8V6M5.5 7.2V8.2" stroke={ink} strokeWidth={1.3} />}
    </>
  );
}
