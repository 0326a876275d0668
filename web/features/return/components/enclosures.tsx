import { Controller } from 'react-hook-form';
import { Checkbox } from '../../../components/ui/checkbox';
import type { ReturnForm } from './decision-fields';

export function Enclosures({ form, canChange }: { form: ReturnForm; canChange: boolean }) {
  return (
    <section aria-label="Enclosures">
      <div className="letter-group">
        <h2>Enclosures</h2>
      </div>
      <div className="choice-line">
        <Checkbox isSelected isDisabled onChange={() => undefined}>
          letter, PDF
        </Checkbox>
        <Controller
          control={form.control}
          name="findingsWorkbook"
          render={({ field }) => (
            <Checkbox isSelected={field.value} onChange={field.onChange} isDisabled={!canChange}>
              findings workbook
            </Checkbox>
          )}
        />
      </div>
    </section>
  );
}
