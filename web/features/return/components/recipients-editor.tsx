import { useFieldArray } from 'react-hook-form';
import { Button } from '../../../components/ui/button';
import { FormText } from '../../../components/ui/form-fields';
import type { ReturnForm } from './decision-fields';

/** Who gets the letter and who gets a copy; each line is name, address and function. */
export function RecipientsEditor({ form, onDone }: { form: ReturnForm; onDone: () => void }) {
  return (
    <div className="recipients">
      <RecipientRows form={form} name="to" word="recipient" />
      <RecipientRows form={form} name="copies" word="copy" />
      <Button
        kind="text"
        onPress={async () => {
          if (await form.trigger(['to', 'copies'])) onDone();
        }}
      >
        Done
      </Button>
    </div>
  );
}

function RecipientRows({ form, name, word }: { form: ReturnForm; name: 'to' | 'copies'; word: string }) {
  const { fields, append, remove } = useFieldArray({ control: form.control, name });
  return (
    <fieldset>
      <legend className="small mute">{name === 'to' ? 'The letter goes to' : 'Copies go to'}</legend>
      {fields.map((field, index) => (
        <div key={field.id} className="recipient">
          <FormText
            control={form.control}
            name={`${name}.${index}.name`}
            label={`Name of ${word} ${index + 1}`}
            placeholder="name"
            hideLabel
          />
          <FormText
            control={form.control}
            name={`${name}.${index}.email`}
            label={`E-mail address of ${word} ${index + 1}`}
            placeholder="address"
            inputMode="email"
            hideLabel
          />
          <FormText
            control={form.control}
            name={`${name}.${index}.function`}
            label={`Function of ${word} ${index + 1}`}
            placeholder="function"
            hideLabel
          />
          <Button kind="text" onPress={() => remove(index)} aria-label={`Take ${word} ${index + 1} out`}>
            Take out
          </Button>
        </div>
      ))}
      <Button kind="text" onPress={() => append({ name: '', email: '', function: '' })}>
        {name === 'to' ? 'Add a recipient' : 'Add a copy'}
      </Button>
    </fieldset>
  );
}
