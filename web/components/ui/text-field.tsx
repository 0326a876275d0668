import type { ReactNode } from 'react';
import {
  TextField as AriaTextField,
  type TextFieldProps as AriaTextFieldProps,
  Input,
  TextArea,
} from 'react-aria-components';
import type { FocusRef } from './field';
import { FieldFrame } from './field-frame';

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
  focusRef?: FocusRef;
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
  focusRef,
  ...props
}: TextFieldProps) {
  const control =
    rows === undefined ? (
      <Input
        ref={focusRef}
        className={`input input-${size}`}
        placeholder={placeholder}
        inputMode={inputMode}
      />
    ) : (
      <TextArea ref={focusRef} className="input" rows={rows} placeholder={placeholder} />
    );
  return (
    <AriaTextField {...props} isInvalid={error !== undefined} className={hideLabel ? 'field-bare' : 'field'}>
      <FieldFrame label={label} hideLabel={hideLabel} help={help} error={error}>
        {control}
      </FieldFrame>
    </AriaTextField>
  );
}

export function TextAreaField({ rows = 3, ...props }: TextFieldProps) {
  return <TextField {...props} rows={rows} />;
}
