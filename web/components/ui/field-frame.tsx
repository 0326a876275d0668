import type { ReactNode } from 'react';
import { FieldError, Label, Text } from 'react-aria-components';
import { FieldErrorLine } from './field';

/** What stands around every control of a form: its label, then the control, help and error under it. */
export function FieldFrame({
  label,
  hideLabel = false,
  help,
  error,
  children,
}: {
  label: string;
  hideLabel?: boolean;
  help?: ReactNode;
  error?: string | undefined;
  children: ReactNode;
}) {
  return (
    <>
      <Label className={hideLabel ? 'hidden-text' : 'field-label'}>{label}</Label>
      <div className="field-control">
        {children}
        {help ? (
          <Text slot="description" className="field-help">
            {help}
          </Text>
        ) : null}
        <FieldError className="field-error-slot">
          {error === undefined ? null : <FieldErrorLine>{error}</FieldErrorLine>}
        </FieldError>
      </div>
    </>
  );
}
