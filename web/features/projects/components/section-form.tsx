import { useState } from 'react';
import type { EditionReference, Project } from '#shared/contracts/projects';
import { Button } from '../../../components/ui/button';
import { Checkbox } from '../../../components/ui/checkbox';
import { Field } from '../../../components/ui/field';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SelectField } from '../../../components/ui/select-field';
import { asProblem } from '../../../lib/problem';
import type { SectionChoice } from '../api/change-section';
import { editionKey } from '../lib/edition-key';

/** An edition and its layers in order; the later layer wins. */
export function SectionForm({
  project,
  start,
  act,
  caution,
  onChoose,
  onLeave,
}: {
  project: Project;
  start: { base: EditionReference; layers: readonly EditionReference[] } | null;
  act: string;
  caution: string;
  onChoose: (choice: SectionChoice) => Promise<void>;
  onLeave: () => void;
}) {
  const [baseKey, setBaseKey] = useState(start ? editionKey(start.base) : null);
  const [layerKeys, setLayerKeys] = useState(start?.layers.map(editionKey) ?? []);
  const [error, setError] = useState<unknown>(null);
  const [isSending, setIsSending] = useState(false);
  const choice = project.choices.find(({ base }) => editionKey(base) === baseKey) ?? null;
  const chosenLayers = layerKeys.flatMap(
    (key) => choice?.layers.filter((layer) => editionKey(layer) === key) ?? [],
  );
  const send = async () => {
    if (!choice) return;
    setIsSending(true);
    setError(null);
    try {
      await onChoose({ base: referenceOf(choice.base), layers: chosenLayers.map(referenceOf) });
    } catch (thrown) {
      setError(thrown);
    } finally {
      setIsSending(false);
    }
  };
  return (
    <div className="section-form">
      {error ? <ProblemNotice problem={asProblem(error)} unaffected="The section is as it was." /> : null}
      <SelectField
        label="Edition"
        choices={project.choices.map(({ base, state }) => ({
          value: editionKey(base),
          label: `${base.title}, edition ${base.edition}`,
          help: state,
        }))}
        value={baseKey}
        onChange={(key) => {
          setBaseKey(key);
          setLayerKeys([]);
        }}
      />
      {choice && choice.layers.length > 0 ? (
        <Field label="Layers">
          <div className="choice-column">
            {choice.layers.map((layer) => (
              <Checkbox
                key={editionKey(layer)}
                isSelected={layerKeys.includes(editionKey(layer))}
                onChange={(selected) =>
                  setLayerKeys(
                    selected
                      ? [...layerKeys, editionKey(layer)]
                      : layerKeys.filter((key) => key !== editionKey(layer)),
                  )
                }
              >
                {layer.title}, edition {layer.edition}
              </Checkbox>
            ))}
          </div>
          {chosenLayers.length > 1 ? (
            <span className="field-help">
              Applied in this order, the later wins:{' '}
              {chosenLayers.map((layer) => layer.title).join(', then ')}.
            </span>
          ) : null}
        </Field>
      ) : null}
      <p className="small mute pt-1">{caution}</p>
      <div className="acts pt-2">
        <Button onPress={() => void send()} isDisabled={!choice} isPending={isSending}>
          {act}
        </Button>
        <Button kind="text" onPress={onLeave}>
          Leave it
        </Button>
      </div>
    </div>
  );
}

function referenceOf({ ruleSet, edition }: EditionReference): { ruleSet: string; edition: string } {
  return { ruleSet, edition };
}
