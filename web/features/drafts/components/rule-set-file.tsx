import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { compareEditions, type EditionComparison } from '#rules/authoring/compare-editions';
import type { DraftDocument } from '#rules/authoring/document-parts';
import type { DocumentProblem } from '#rules/rule-sets/problem';
import { resolveEdition } from '#rules/rule-sets/resolve';
import { isLayer, parseRuleSet } from '#rules/rule-sets/schema';
import { Field } from '../../../components/ui/field';
import { type EditionDocument, useEditionDocument } from '../../../lib/queries/edition-document-query';
import { ruleSetsQuery } from '../../../lib/queries/rule-sets-query';

/** A rule set taken in from a file: its faults, or what it would change, before anything is made. */
export function RuleSetFile({ onChange }: { onChange: (document: DraftDocument | null) => void }) {
  const [read, setRead] = useState<Read | null>(null);
  const take = async (file: File | undefined) => {
    if (file === undefined) return;
    const next = readFile(await file.text());
    setRead(next);
    onChange(next.ok ? next.document : null);
  };
  return (
    <>
      <Field label={<label htmlFor="rule-set-file">File</label>}>
        <input
          id="rule-set-file"
          type="file"
          accept=".json,application/json"
          onChange={(event) => void take(event.target.files?.[0])}
        />
        <span className="field-help">a rule set saved as clauseway/rule-set@1</span>
      </Field>
      {read === null ? null : read.ok ? (
        <WhatChanges document={read.document} />
      ) : (
        <Faults problems={read.problems} />
      )}
    </>
  );
}

type Read = { ok: true; document: DraftDocument } | { ok: false; problems: DocumentProblem[] };

function readFile(text: string): Read {
  let document: unknown;
  try {
    document = JSON.parse(text);
  } catch {
    const detail = 'The file is not JSON, so it cannot be a rule set.';
    return {
      ok: false,
      problems: [{ pointer: '', detail, fix: 'Choose a file that was exported from here.' }],
    };
  }
  const parsed = parseRuleSet(document);
  return parsed.ok
    ? { ok: true, document: document as DraftDocument }
    : { ok: false, problems: parsed.problems };
}

function Faults({ problems }: { problems: readonly DocumentProblem[] }) {
  return (
    <div className="problem-notice" role="alert">
      <p>
        <b>The file cannot be taken in.</b>
      </p>
      <ul>
        {problems.map(({ pointer, detail, fix }) => (
          <li key={`${pointer}${detail}`}>
            {detail} <span className="mute">{fix}</span>
          </li>
        ))}
      </ul>
    </div>
  );
}

/** Against the newest published edition of the same rule set. */
function WhatChanges({ document }: { document: DraftDocument }) {
  const { ruleSets } = useSuspenseQuery(ruleSetsQuery()).data;
  const own = ruleSets.find(({ id }) => id === document.id)?.editions ?? [];
  const newest = own.findLast(({ draftId }) => draftId === null);
  const before = useEditionDocument(newest ? { ruleSet: newest.ruleSet, edition: newest.edition } : null);
  if (newest === undefined)
    return <p className="small">Nothing of this rule set is here yet: all of it is new.</p>;
  const comparison = comparisonOf(before?.parsed ?? null, document);
  if (comparison === null) return null;
  const count = (kind: string) => comparison.rules.filter((rule) => rule.kind === kind).length;
  return (
    <p className="small" role="status">
      Against edition {newest.edition}: {count('added')} rules added, {count('changed')} changed,{' '}
      {count('removed')} removed, {comparison.unchanged} the same; {comparison.tables.length} tables differ.
    </p>
  );
}

function comparisonOf(before: EditionDocument['parsed'], document: DraftDocument): EditionComparison | null {
  const parsed = parseRuleSet(document);
  if (before === null || !parsed.ok || isLayer(before) || isLayer(parsed.ruleSet)) return null;
  const old = resolveEdition(before);
  const now = resolveEdition(parsed.ruleSet);
  return old.ok && now.ok ? compareEditions(old.edition, now.edition) : null;
}
