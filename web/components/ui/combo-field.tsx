import type { ReactNode } from 'react';
import {
  Button,
  ComboBox,
  FieldError,
  Input,
  Label,
  ListBox,
  ListBoxItem,
  Popover,
  Text,
} from 'react-aria-components';
import { FieldErrorLine } from './field';

/** One of many choices, found by typing a part of it. */
export function ComboField({
  label,
  name,
  choices,
  value,
  onChange,
  onBlur,
  help,
  error,
}: {
  label: string;
  name: string;
  choices: readonly string[];
  value: string;
  onChange: (value: string) => void;
  onBlur?: () => void;
  help?: ReactNode;
  error?: string | undefined;
}) {
  return (
    <ComboBox
      className="field"
      defaultInputValue={value}
      defaultSelectedKey={choices.includes(value) ? value : null}
      onSelectionChange={(key) => {
        if (key !== null) onChange(String(key));
      }}
      {...(onBlur ? { onBlur } : {})}
      isInvalid={error !== undefined}
      menuTrigger="input"
    >
      <Label className="field-label">{label}</Label>
      <div className="field-control">
        <span className="combo">
          <Input className="input input-middle" name={name} />
          <Button className="combo-button">
            <svg className="select-arrow" viewBox="0 0 8 5" aria-hidden="true">
              <path d="M0 0H8L4 5Z" fill="currentColor" />
            </svg>
          </Button>
        </span>
        {help ? (
          <Text slot="description" className="field-help">
            {help}
          </Text>
        ) : null}
        <FieldError className="field-error-slot">
          {error === undefined ? null : <FieldErrorLine>{error}</FieldErrorLine>}
        </FieldError>
      </div>
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
