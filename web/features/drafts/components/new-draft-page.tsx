import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import { Button } from '../../../components/ui/button';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RadioLine } from '../../../components/ui/radio-line';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { paths } from '../../../lib/paths';
import { asProblem, type Problem } from '../../../lib/problem';
import { ruleSetsQuery } from '../../../lib/queries/rule-sets-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { type NewDraft, startingPointsQuery, useStartDraft } from '../api/start-draft';
import { RuleSetFile } from './rule-set-file';

type Kind = NewDraft['from']['kind'];
type From = NewDraft['from'];

const kinds = [
  { value: 'edition', label: 'a published edition' },
  { value: 'starting point', label: 'a starting point' },
  { value: 'file', label: 'a file' },
  { value: 'nothing', label: 'nothing' },
] as const satisfies readonly { value: Kind; label: string }[];

/** A draft begins from something: most often from the edition in force. */
export function NewDraftPage() {
  usePageTitle('Begin a draft');
  const [search] = useSearchParams();
  const named = search.get('ruleSet') ?? '';
  const [kind, setKind] = useState<Kind>('edition');
  const [edition, setEdition] = useState('');
  const [from, setFrom] = useState<From | null>(
    named === '' ? null : { kind: 'edition', ruleSet: named, edition: search.get('edition') ?? '' },
  );
  const [problem, setProblem] = useState<Problem | null>(null);
  const [missing, setMissing] = useState(false);
  const start = useStartDraft();
  const navigate = useNavigate();
  const begin = async () => {
    setMissing(from === null || edition.trim() === '');
    if (from === null || edition.trim() === '') return;
    try {
      const draft = await start({ edition, from });
      await navigate(paths.draft(draft.ruleSet, draft.id));
    } catch (error) {
      setProblem(asProblem(error));
    }
  };
  return (
    <PlainPage>
      <PageHead
        kicker={<Link to={paths.ruleSets}>Rule sets</Link>}
        title="Begin a draft"
        lede="What it starts from stays as it is. Nothing is checked against a draft until it is published."
      />
      <div className="form-column">
        {problem ? <ProblemNotice problem={problem} unaffected="Nothing was made." /> : null}
        <div className="fieldset">
          <RadioLine
            label="Starts from"
            choices={kinds}
            value={kind}
            onChange={(next) => {
              setKind(next);
              setFrom(null);
            }}
          />
          <StartFields kind={kind} from={from} onChange={setFrom} />
          <TextField
            label="Name of the edition"
            value={edition}
            onChange={setEdition}
            maxLength={40}
            help="such as 2028"
            error={missing && edition.trim() === '' ? 'Name the edition, such as 2028.' : undefined}
          />
        </div>
        {missing && from === null ? (
          <p className="field-error" role="alert">
            Choose what the draft starts from.
          </p>
        ) : null}
        <div className="acts pt-4">
          <Button kind="primary" onPress={() => void begin()}>
            Begin the draft
          </Button>
          <Link to={paths.ruleSets}>Leave it</Link>
        </div>
      </div>
      <RunningFoot
        texts={kind === 'starting point' ? [cautions.startingPoint, cautions.contract] : [cautions.contract]}
      />
    </PlainPage>
  );
}

function StartFields({
  kind,
  from,
  onChange,
}: {
  kind: Kind;
  from: From | null;
  onChange: (from: From | null) => void;
}) {
  switch (kind) {
    case 'edition':
      return <EditionChoice from={from} onChange={onChange} />;
    case 'starting point':
      return <StartingPointChoice from={from} onChange={onChange} />;
    case 'file':
      return <RuleSetFile onChange={(document) => onChange(document && { kind: 'file', document })} />;
    case 'nothing':
      return <EmptySet from={from} onChange={onChange} />;
  }
}

interface Choosing {
  from: From | null;
  onChange: (from: From | null) => void;
}

function usePublishedEditions() {
  const { ruleSets } = useSuspenseQuery(ruleSetsQuery()).data;
  return ruleSets
    .flatMap(({ editions }) => editions)
    .filter(({ draftId }) => draftId === null)
    .map((edition) => ({ ...edition, name: `${edition.ruleSet}@${edition.edition}` }));
}

function EditionChoice({ from, onChange }: Choosing) {
  const editions = usePublishedEditions();
  return (
    <SelectField
      label="Edition"
      choices={editions.map(({ name, title, edition, state }) => ({
        value: name,
        label: `${title}, ${edition}`,
        help: state,
      }))}
      value={from?.kind === 'edition' ? `${from.ruleSet}@${from.edition}` : null}
      onChange={(chosen) => {
        const found = editions.find(({ name }) => name === chosen);
        onChange(found ? { kind: 'edition', ruleSet: found.ruleSet, edition: found.edition } : null);
      }}
    />
  );
}

function StartingPointChoice({ from, onChange }: Choosing) {
  const { startingPoints } = useSuspenseQuery(startingPointsQuery()).data;
  return (
    <SelectField
      label="Starting point"
      choices={startingPoints.map(({ file, title, edition, rules }) => ({
        value: file,
        label: `${title}, ${edition}`,
        help: `${rules} rules`,
      }))}
      value={from?.kind === 'starting point' ? from.file : null}
      onChange={(file) => onChange({ kind: 'starting point', file })}
      help="every limit is to be checked against the agency’s own specification"
    />
  );
}

function EmptySet({ from, onChange }: Choosing) {
  const editions = usePublishedEditions();
  const now =
    from?.kind === 'nothing' ? from : { kind: 'nothing' as const, ruleSet: '', title: '', layerOf: null };
  return (
    <>
      <TextField
        label="Title"
        value={now.title}
        onChange={(title) => onChange({ ...now, title })}
        maxLength={200}
        size="wide"
      />
      <TextField
        label="Short name"
        value={now.ruleSet}
        onChange={(ruleSet) => onChange({ ...now, ruleSet })}
        maxLength={80}
        help="small letters, digits and hyphens; it stays for every edition"
      />
      <SelectField
        label="Sits over"
        choices={[
          { value: '', label: 'nothing: a base edition' },
          ...editions.map(({ name, title, edition }) => ({ value: name, label: `${title}, ${edition}` })),
        ]}
        value={now.layerOf === null ? '' : `${now.layerOf.id}@${now.layerOf.edition}`}
        onChange={(chosen) => {
          const over = editions.find(({ name }) => name === chosen);
          onChange({ ...now, layerOf: over ? { id: over.ruleSet, edition: over.edition } : null });
        }}
        help="a supplement or special provision changes a base edition"
      />
    </>
  );
}
