import type { ReactNode } from 'react';
import { Radio, RadioGroup } from 'react-aria-components';
import { type FocusRef, focusWithin } from './field';
import { FieldFrame } from './field-frame';
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
  focusRef,
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
  focusRef?: FocusRef;
}) {
  return (
    <RadioGroup
      ref={focusWithin(focusRef)}
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
      <FieldFrame label={label} hideLabel={hideLabel} help={help} error={error}>
        <div className={column ? 'choice-column' : 'choice-line'}>
          {choices.map((choice) => (
            <Radio key={choice.value} value={choice.value} className="choice choice-radio">
              {choice.label}
              {choice.help ? <span className="field-help">{choice.help}</span> : null}
            </Radio>
          ))}
        </div>
      </FieldFrame>
    </RadioGroup>
  );
}
