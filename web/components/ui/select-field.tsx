import type { ReactNode } from 'react';
import {
  Select as AriaSelect,
  Button,
  ListBox,
  ListBoxItem,
  Popover,
  SelectValue,
} from 'react-aria-components';
import { type FocusRef, focusWithin } from './field';
import { FieldFrame } from './field-frame';

export interface Choice<Value extends string> {
  value: Value;
  label: string;
  help?: string;
}

/** One of more than four choices; up to four are a `RadioLine`. */
export function SelectField<Value extends string>({
  label,
  choices,
  value,
  onChange,
  help,
  error,
  placeholder = 'choose',
  hideLabel = false,
  isDisabled = false,
  focusRef,
}: {
  label: string;
  choices: readonly Choice<Value>[];
  value: Value | null;
  onChange: (value: Value) => void;
  help?: ReactNode;
  error?: string | undefined;
  placeholder?: string;
  hideLabel?: boolean;
  isDisabled?: boolean;
  focusRef?: FocusRef;
}) {
  return (
    <AriaSelect
      ref={focusWithin(focusRef)}
      className={hideLabel ? 'field-bare' : 'field'}
      placeholder={placeholder}
      value={value}
      onChange={(key) => {
        const chosen = choices.find((choice) => choice.value === key);
        if (chosen) onChange(chosen.value);
      }}
      isInvalid={error !== undefined}
      isDisabled={isDisabled}
    >
      <FieldFrame label={label} hideLabel={hideLabel} help={help} error={error}>
        <Button className="select-button">
          <SelectValue />
          <svg className="select-arrow" viewBox="0 0 8 5" aria-hidden="true">
            <path d="M0 0H8L4 5Z" fill="currentColor" />
          </svg>
        </Button>
      </FieldFrame>
      <Popover className="popover" offset={2}>
        <ListBox className="list-box" items={choices}>
          {(choice) => (
            <ListBoxItem id={choice.value} textValue={choice.label} className="menu-item">
              <span>{choice.label}</span>
              {choice.help ? <small>{choice.help}</small> : null}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </AriaSelect>
  );
}
