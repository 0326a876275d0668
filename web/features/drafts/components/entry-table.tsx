import { useState } from 'react';
import { partsOf } from '#rules/authoring/document-parts';
import { Button } from '../../../components/ui/button';
import { SectionHead } from '../../../components/ui/section-head';
import { SelectField } from '../../../components/ui/select-field';
import { Sideways } from '../../../components/ui/sideways';
import { TextField } from '../../../components/ui/text-field';
import { isLayerDraft } from '../lib/draft-rules';
import { type EntryColumn, textOfField, valueOfText } from '../lib/entry-fields';
import { useDraftInHand } from './draft-layout';

type Entry = Record<string, unknown>;

/** A list of the draft whose entries have a handful of fields each. */
export function EntryTable({
  list,
  nameField,
  title,
  about,
  columns,
  fresh,
}: {
  list: 'attributes' | 'quantities' | 'documents';
  /** The field that names an entry for rules; it is given once. */
  nameField: 'name' | 'id' | 'type';
  title: string;
  about: string;
  columns: readonly EntryColumn[];
  fresh: Entry;
}) {
  const { editing } = useDraftInHand();
  const { draft, document, change } = editing;
  const isLayer = isLayerDraft(draft.document);
  const own = isLayer && list === 'attributes' ? 'add.attributes' : list;
  const entries = [...partsOf(document)].filter(([part]) => part.startsWith(`${own}/`));
  const mayChange = draft.abilities.change;
  const heads = ['Name', ...columns.map(({ label }) => label), ...(mayChange ? ['Acts'] : [])];
  return (
    <>
      <SectionHead title={title} about={about} />
      {entries.length === 0 ? null : (
        <Sideways label={title}>
          <table className="table table-head-over">
            <caption className="hidden-text">{title}</caption>
            <thead>
              <tr>
                {heads.map((head) => (
                  <th key={head} scope="col">
                    {head}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {entries.map(([part, entry]) => (
                <EntryRow
                  key={part}
                  entry={entry as Entry}
                  nameField={nameField}
                  columns={columns}
                  mayChange={mayChange}
                  onChange={(after) => change([{ part, after }])}
                />
              ))}
            </tbody>
          </table>
        </Sideways>
      )}
      {mayChange ? (
        <AddEntry
          title={title}
          taken={entries.map(([part]) => part)}
          onAdd={(name) => change([{ part: `${own}/${name}`, after: { [nameField]: name, ...fresh } }])}
          partOf={(name) => `${own}/${name}`}
        />
      ) : null}
    </>
  );
}

function EntryRow({
  entry,
  nameField,
  columns,
  mayChange,
  onChange,
}: {
  entry: Entry;
  nameField: string;
  columns: readonly EntryColumn[];
  mayChange: boolean;
  onChange: (after: Entry | null) => void;
}) {
  const name = String(entry[nameField]);
  return (
    <tr>
      <th scope="row">{name}</th>
      {columns.map((column) => (
        <td key={column.field}>
          <EntryField
            column={column}
            label={`${column.label} of ${name}`}
            value={entry[column.field]}
            isDisabled={!mayChange}
            onChange={(value) => {
              const { [column.field]: _, ...rest } = entry;
              onChange(value === undefined ? rest : { ...rest, [column.field]: value });
            }}
          />
        </td>
      ))}
      {mayChange ? (
        <td>
          <Button kind="inline" onPress={() => onChange(null)} aria-label={`Remove ${name}`}>
            Remove
          </Button>
        </td>
      ) : null}
    </tr>
  );
}

function EntryField({
  column,
  label,
  value,
  isDisabled,
  onChange,
}: {
  column: EntryColumn;
  label: string;
  value: unknown;
  isDisabled: boolean;
  onChange: (value: unknown) => void;
}) {
  const [typed, setTyped] = useState<string | null>(null);
  if (column.kind === 'choice') {
    return (
      <SelectField
        label={label}
        hideLabel
        choices={column.choices.map((each) => ({ value: each, label: each }))}
        value={typeof value === 'string' ? value : null}
        onChange={onChange}
        isDisabled={isDisabled}
      />
    );
  }
  const read = typed === null ? null : valueOfText(column, typed, value);
  return (
    <TextField
      label={label}
      hideLabel
      value={typed ?? textOfField(column, value)}
      onChange={setTyped}
      onBlur={() => {
        if (read?.ok) onChange(read.value);
        if (read?.ok !== false) setTyped(null);
      }}
      isDisabled={isDisabled}
      error={read?.ok === false ? read.detail : undefined}
    />
  );
}

function AddEntry({
  title,
  taken,
  partOf,
  onAdd,
}: {
  title: string;
  taken: readonly string[];
  partOf: (name: string) => string;
  onAdd: (name: string) => void;
}) {
  const [name, setName] = useState('');
  const isTaken = taken.includes(partOf(name.trim()));
  const word = title.toLowerCase();
  return (
    <div className="acts pt-2">
      <TextField
        label={`Name of one more of the ${word}`}
        hideLabel
        placeholder="name"
        value={name}
        onChange={setName}
        maxLength={120}
        error={isTaken ? 'This name is given already.' : undefined}
      />
      <Button
        kind="text"
        isDisabled={name.trim() === '' || isTaken}
        onPress={() => {
          onAdd(name.trim());
          setName('');
        }}
      >
        Add to the {word}
      </Button>
    </div>
  );
}
