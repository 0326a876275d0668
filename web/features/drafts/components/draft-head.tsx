import { partsOf } from '#rules/authoring/document-parts';
import { RadioLine } from '../../../components/ui/radio-line';
import { TextField } from '../../../components/ui/text-field';
import type { DraftEditing } from '../hooks/use-working-copy';
import { isLayerDraft } from '../lib/draft-rules';
import { fieldsIn, type RuleField } from '../lib/rule-fields';

/** The particulars of a draft: what it is called and when it is in force, and how the design point is found. */
export function DraftHead({ editing }: { editing: DraftEditing }) {
  const { draft, document, change } = editing;
  const head = partsOf(document).get('head') as RuleField;
  const isDisabled = !draft.abilities.change;
  const set = (fields: RuleField) => change([{ part: 'head', after: { ...head, ...fields } }]);
  const effective = fieldsIn(head.effective);
  const designPoint = fieldsIn(head.designPoint);
  const isLayer = isLayerDraft(head);
  return (
    <div className="fieldset">
      <TextField
        label="Title"
        size="wide"
        value={textIn(head.title)}
        onChange={(title) => title.trim() !== '' && set({ title })}
        maxLength={200}
        isDisabled={isDisabled}
      />
      <TextField
        label="In force from"
        type="date"
        value={textIn(effective.from)}
        onChange={(from) => set({ effective: { ...effective, from: from === '' ? null : from } })}
        isDisabled={isDisabled}
        help="the first day, in the agency’s calendar"
      />
      <TextField
        label="To"
        type="date"
        value={textIn(effective.to)}
        onChange={(to) => set({ effective: { ...effective, to: to === '' ? null : to } })}
        isDisabled={isDisabled}
        help="the last day; empty until the next edition begins"
      />
      {isLayer ? null : (
        <>
          <TextField
            label="Design air voids"
            size="number"
            inputMode="decimal"
            value={String(designPoint.targetAirVoids ?? 4)}
            onChange={(text) => {
              const targetAirVoids = Number(text);
              if (targetAirVoids > 0) set({ designPoint: { ...designPoint, targetAirVoids } });
            }}
            isDisabled={isDisabled}
            help="%"
          />
          <RadioLine
            label="Between trials"
            choices={[
              { value: 'quadratic', label: 'quadratic' },
              { value: 'linear', label: 'linear' },
            ]}
            value={designPoint.fit === 'linear' ? 'linear' : 'quadratic'}
            onChange={(fit) => set({ designPoint: { ...designPoint, fit } })}
            isDisabled={isDisabled}
          />
        </>
      )}
    </div>
  );
}

function textIn(value: unknown): string {
  return typeof value === 'string' ? value : '';
}
