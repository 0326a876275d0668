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

/** Where a form puts the focus when this field is the first in error. */
export type FocusRef = (target: { focus: () => void } | null) => void;

/** For a control that is a group: its chosen or first part takes the focus. */
export function focusWithin(focusRef: FocusRef | undefined): (element: HTMLElement | null) => void {
  return (element) =>
    focusRef?.(
      element && {
        focus: () =>
          element.querySelector<HTMLElement>('input:checked, input:not([type=hidden]), button')?.focus(),
      },
    );
}
