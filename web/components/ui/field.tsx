import type { ReactNode } from 'react';
import { Mark } from './mark';

/** A line of a form: label left, control on its baseline, help after it, the error under it. */
export function Field({
  label,
  children,
}: {
  /** The label element of the control, or plain words over a group that names itself. */
  label: ReactNode;
  children: ReactNode;
}) {
  return (
    <div className="field">
      <div className="field-label">{label}</div>
      <div className="field-control">{children}</div>
    </div>
  );
}

export function FieldErrorLine({ children }: { children: ReactNode }) {
  return (
    <span className="field-error">
      <Mark name="fail" />
      <span>{children}</span>
    </span>
  );
}
