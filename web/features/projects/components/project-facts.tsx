import { Controller } from 'react-hook-form';
import { TextField } from '../../../components/ui/text-field';
import { factWords, offeredFacts } from '../lib/fact-words';
import type { ProjectFormState } from './project-form';

/**
 * The attributes that specifications branch on most; an empty field states nothing. They are sent as typed: what they
 * mean is for the sections to say.
 */
export function ProjectFacts({ form }: { form: ProjectFormState }) {
  return (
    <Controller
      control={form.control}
      name="facts"
      render={({ field, formState }) => {
        const names = [...new Set([...offeredFacts, ...Object.keys(field.value)])];
        return (
          <div className="fieldset">
            {names.map((name) => (
              <TextField
                key={name}
                label={factWords(name)}
                value={field.value[name] === undefined ? '' : String(field.value[name])}
                onChange={(text) => {
                  const { [name]: _, ...rest } = field.value;
                  field.onChange(text.trim() === '' ? rest : { ...rest, [name]: text });
                }}
                onBlur={field.onBlur}
                error={formState.errors.facts?.[name]?.message}
              />
            ))}
          </div>
        );
      }}
    />
  );
}
