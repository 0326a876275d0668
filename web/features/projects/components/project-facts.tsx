import { Controller } from 'react-hook-form';
import { TextField } from '../../../components/ui/text-field';
import { factOf, factWords, offeredFacts } from '../lib/fact-words';
import type { ProjectFormState } from './project-form';

/** The attributes that specifications branch on most; an empty field states nothing. */
export function ProjectFacts({ form }: { form: ProjectFormState }) {
  return (
    <Controller
      control={form.control}
      name="facts"
      render={({ field, fieldState }) => {
        const names = [...new Set([...offeredFacts, ...Object.keys(field.value)])];
        return (
          <div className="fieldset">
            {names.map((name, index) => (
              <TextField
                key={name}
                label={factWords(name)}
                value={field.value[name] === undefined ? '' : String(field.value[name])}
                onChange={(text) => {
                  const { [name]: _, ...rest } = field.value;
                  field.onChange(text.trim() === '' ? rest : { ...rest, [name]: factOf(name, text) });
                }}
                onBlur={field.onBlur}
                error={index === 0 ? fieldState.error?.message : undefined}
              />
            ))}
          </div>
        );
      }}
    />
  );
}
