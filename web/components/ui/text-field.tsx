import type { ReactNode } from 'react';
import {
  TextField as AriaTextField,
  type TextFieldProps as AriaTextFieldProps,
  FieldError,
  Input,
  Label,
  Text,
  TextArea,
} from 'react-aria-components';
import { FieldErrorLine } from './field';

export interface TextFieldProps extends Omit<AriaTextFieldProps, 'children' | 'className' | 'isInvalid'> {
  label: string;
  help?: ReactNode;
  /** What is wrong and what to enter; absent while nothing is. */
  error?: string | undefined;
  size?: 'middle' | 'wide' | 'number';
  placeholder?: string;
  /** Lines of a longer text; without it the field has one line. */
  rows?: number;
  inputMode?: 'decimal' | 'numeric' | 'email' | 'text';
  /** True in a table or beside other words that already name it for the eye. */
  hideLabel?: boolean;
}

export function TextField({
  label,
  help,
  error,
  size = 'middle',
  placeholder,
  rows,
  inputMode,
  hideLabel = false,
  ...props
}: TextFieldProps) {
  const control =
    rows === undefined ? (
      <Input className={`input input-${size}`} placeholder={placeholder} inputMode={inputMode} />
    ) : (
      <TextArea className="input" rows={rows} placeholder={placeholder} />
    );
  return (
    <AriaTextField {...props} isInvalid={error !== undefined} className={hideLabel ? 'field-bare' : 'field'}>
      <Label className={hideLabel ? 'hidden-text' : 'field-label'}>{label}</Label>
      <div className="field-control">
        {control}
        {help ? (
          <Text slot="description" className="field-help">
            {help}
          </Text>
        ) : null}
        <FieldError className="field-error-slot">
          {error === undefined ? null : <FieldErrorLine>{error}</FieldErrorLine>}
        </FieldError>
      </div>
    </AriaTextField>
  );
}

export function TextAreaField({ rows = 3, ...props }: TextFieldProps) {
  return <TextField {...props} rows={rows} />;
}
