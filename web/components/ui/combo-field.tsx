import type { ReactNode } from 'react';
import { Button, ComboBox, Input, ListBox, ListBoxItem, Popover } from 'react-aria-components';
import type { FocusRef } from './field';
import { FieldFrame } from './field-frame';

/** One of many choices, found by typing a part of it. */
export function ComboField({
  label,
  hideLabel = false,
  name,
  choices,
  value,
  onChange,
  onBlur,
  help,
  error,
  focusRef,
}: {
  label: string;
  hideLabel?: boolean;
  name: string;
  choices: readonly string[];
  value: string;
  onChange: (value: string) => void;
  onBlur?: () => void;
  help?: ReactNode;
  error?: string | undefined;
  focusRef?: FocusRef;
}) {
  return (
    <ComboBox
      className={hideLabel ? 'field-bare' : 'field'}
      defaultInputValue={value}
      defaultSelectedKey={choices.includes(value) ? value : null}
      onSelectionChange={(key) => {
        if (key !== null) onChange(String(key));
      }}
      {...(onBlur ? { onBlur } : {})}
      isInvalid={error !== undefined}
      menuTrigger="input"
    >
      <FieldFrame label={label} hideLabel={hideLabel} help={help} error={error}>
        <span className="combo">
          <Input ref={focusRef} className="input input-middle" name={name} />
          <Button className="combo-button">
            <svg className="select-arrow" viewBox="0 0 8 5" aria-hidden="true">
              <path d="M0 0H8L4 5Z" fill="currentColor" />
            </svg>
          </Button>
        </span>
      </FieldFrame>
      <Popover className="popover" offset={2}>
        <ListBox className="list-box">
          {choices.map((choice) => (
            <ListBoxItem key={choice} id={choice} textValue={choice} className="menu-item">
              {choice}
            </ListBoxItem>
          ))}
        </ListBox>
      </Popover>
    </ComboBox>
  );
}
