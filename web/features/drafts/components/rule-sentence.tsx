import type { EditionView } from '#rules/rule-sets/edition-view';
import type { Rule } from '#rules/rule-sets/schema';
import { ruleSentenceParts } from '#rules/rule-sets/sentences';

/** The rule as it reads: each part that the form controls is underlined and leads to its control. */
export function RuleSentence({
  clause,
  rule,
  view,
}: {
  clause: string;
  /** Null while something of it cannot be read yet. */
  rule: Rule | null;
  view: EditionView;
}) {
  if (rule === null) {
    return (
      <p className="live-sentence">
        <b>{clause}</b> <span className="mute">is not whole yet: see what is said at its fields.</span>
      </p>
    );
  }
  return (
    <p className="live-sentence" aria-live="polite">
      <b>{clause}</b>{' '}
      {ruleSentenceParts(rule, view).map(({ field, text }, index) =>
        field === null ? (
          text
        ) : (
          <button
            // biome-ignore lint/suspicious/noArrayIndexKey: parts of one sentence, in its order.
            key={index}
            type="button"
            className="live-part"
            data-part={field}
            onClick={() => focusField(field)}
          >
            {text}
          </button>
        ),
      )}
    </p>
  );
}

function focusField(field: string): void {
  const row = document.querySelector<HTMLElement>(`[data-rule-field="${field}"]`);
  row?.querySelector<HTMLElement>('input:not([type=hidden]), button, textarea')?.focus();
}
