import type { ReactNode } from 'react';
import { FieldError, Label, Radio, RadioGroup, Text } from 'react-aria-components';
import { FieldErrorLine } from './field';
import type { Choice } from './select-field';

/** Up to four choices, all in sight. */
export function RadioLine<Value extends string>({
  label,
  choices,
  value,
  onChange,
  help,
  error,
  hideLabel = false,
  column = false,
  isDisabled = false,
}: {
  label: string;
  choices: readonly Choice<Value>[];
  value: Value | null;
  onChange: (value: Value) => void;
  help?: ReactNode;
  error?: string | undefined;
  hideLabel?: boolean;
  /** One under the other, where the words are long. */
  column?: boolean;
  isDisabled?: boolean;
}) {
  return (
    <RadioGroup
      className={hideLabel ? 'field-bare' : 'field'}
      value={value}
      onChange={(key) => {
        const chosen = choices.find((choice) => choice.value === key);
        if (chosen) onChange(chosen.value);
      }}
      isInvalid={error !== undefined}
      isDisabled={isDisabled}
      orientation={column ? 'vertical' : 'horizontal'}
    >
      <Label className={hideLabel ? 'hidden-text' : 'field-label'}>{label}</Label>
      <div className="field-control">
        <div className={column ? 'choice-column' : 'choice-line'}>
          {choices.map((choice) => (
            <Radio key={choice.value} value={choice.value} className="choice choice-radio">
              {choice.label}
              {choice.help ? <span className="field-help">{choice.help}</span> : null}
            </Radio>
          ))}
        </div>
        {help ? (
          <Text slot="description" className="field-help">
            {help}
          </Text>
        ) : null}
        <FieldError className="field-error-slot">
          {error === undefined ? null : <FieldErrorLine>{error}</FieldErrorLine>}
        </FieldError>
      </div>
    </RadioGroup>
  );
}
