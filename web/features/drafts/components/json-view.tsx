import { useState } from 'react';
import type { DraftDocument } from '#rules/authoring/document-parts';
import { Button } from '../../../components/ui/button';
import { TextAreaField } from '../../../components/ui/text-field';
import type { DraftEditing } from '../hooks/use-working-copy';
import { editsBetween } from '../lib/edits-between';

/** The whole draft as its text. What is taken over changes no part that reads the same. */
export function JsonView({ editing }: { editing: DraftEditing }) {
  const { document, change, draft } = editing;
  return (
    <JsonText
      label="The draft as JSON"
      value={document}
      isDisabled={!draft.abilities.change}
      onTakeOver={(next) => change(editsBetween(document, next))}
    />
  );
}

/** A text that is edited apart and taken over whole, once it can be read. */
export function JsonText({
  label,
  value,
  isDisabled,
  onTakeOver,
}: {
  label: string;
  value: Record<string, unknown>;
  isDisabled: boolean;
  onTakeOver: (value: DraftDocument) => void;
}) {
  const shown = JSON.stringify(value, null, 2);
  const [text, setText] = useState<string | null>(null);
  const read = text === null ? null : readText(text);
  return (
    <div className="json-view">
      <TextAreaField
        label={label}
        hideLabel
        rows={28}
        value={text ?? shown}
        onChange={setText}
        isReadOnly={isDisabled}
        spellCheck="false"
        error={read?.ok === false ? read.detail : undefined}
      />
      {isDisabled ? null : (
        <div className="acts pt-2">
          <Button
            isDisabled={read === null || !read.ok}
            onPress={() => {
              if (read?.ok !== true) return;
              onTakeOver(read.value);
              setText(null);
            }}
          >
            Take the text over
          </Button>
          {text === null ? null : (
            <Button kind="text" onPress={() => setText(null)}>
              Leave it
            </Button>
          )}
        </div>
      )}
    </div>
  );
}

type Read = { ok: true; value: DraftDocument } | { ok: false; detail: string };

function readText(text: string): Read {
  try {
    const value: unknown = JSON.parse(text);
    if (typeof value === 'object' && value !== null && !Array.isArray(value)) {
      return { ok: true, value: value as DraftDocument };
    }
    return { ok: false, detail: 'This is not an object: begin with { and end with }.' };
  } catch (error) {
    const why = error instanceof Error ? error.message : 'it is not JSON';
    return { ok: false, detail: `The text cannot be read yet: ${why}.` };
  }
}
