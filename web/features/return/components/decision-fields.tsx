import { useState } from 'react';
import { Controller, type UseFormReturn, useWatch } from 'react-hook-form';
import type { Disposition } from '#rules/engine/finding';
import type { ReturnFields, ReturnView } from '#shared/contracts/returns';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { Field, FieldErrorLine } from '../../../components/ui/field';
import { FormText } from '../../../components/ui/form-fields';
import { RadioLine } from '../../../components/ui/radio-line';
import { recipientWords } from '../lib/recipient-words';
import { RecipientsEditor } from './recipients-editor';

export type ReturnForm = UseFormReturn<ReturnFields, unknown, ReturnFields>;

const dispositions: Disposition[] = ['approved', 'approved as noted', 'revise and resubmit', 'rejected'];

export function DecisionFields({ view, form }: { view: ReturnView; form: ReturnForm }) {
  const { control } = form;
  const isDisabled = !view.abilities.change;
  return (
    <div className="fieldset decision-fields">
      <Controller
        control={control}
        name="disposition"
        render={({ field, fieldState }) => (
          <RadioLine
            label="Disposition"
            choices={dispositions.map((value) => ({ value, label: value }))}
            value={field.value}
            onChange={field.onChange}
            help={`The findings recommend ${view.recommended}. ${view.recommendation}`}
            error={fieldState.error?.message}
            isDisabled={isDisabled}
          />
        )}
      />
      <FormText
        control={control}
        name="reason"
        label="Reason"
        rows={2}
        maxLength={limits.reasonCharacters}
        isDisabled={isDisabled}
      />
      <Recipients form={form} isDisabled={isDisabled} />
      <FormText
        control={control}
        name="textAbove"
        label="Text above"
        rows={2}
        maxLength={limits.letterTextCharacters}
        isDisabled={isDisabled}
      />
      <FormText
        control={control}
        name="textBelow"
        label="Text below"
        rows={2}
        maxLength={limits.letterTextCharacters}
        isDisabled={isDisabled}
      />
    </div>
  );
}

function Recipients({ form, isDisabled }: { form: ReturnForm; isDisabled: boolean }) {
  const [isOpen, setIsOpen] = useState(false);
  const [to, copies] = useWatch({ control: form.control, name: ['to', 'copies'] });
  const { errors } = form.formState;
  const message = errors.to?.message ?? errors.to?.root?.message ?? errors.copies?.message;
  const hasFault = Boolean(errors.to ?? errors.copies);
  return (
    <Field label="To">
      {isOpen || hasFault ? (
        <RecipientsEditor form={form} onDone={() => setIsOpen(false)} />
      ) : (
        <span>
          {to.map(recipientWords).join('; ')}
          {copies.length > 0 ? (
            <span className="mute"> · copy to {copies.map(recipientWords).join('; ')}</span>
          ) : null}{' '}
          {isDisabled ? null : (
            <Button kind="inline" onPress={() => setIsOpen(true)} aria-label="Change the recipients">
              Change
            </Button>
          )}
        </span>
      )}
      {message ? <FieldErrorLine>{message}</FieldErrorLine> : null}
    </Field>
  );
}
