import { Link, useNavigate } from 'react-router-dom';
import { partsOf } from '#rules/authoring/document-parts';
import { Button } from '../../../components/ui/button';
import { SectionHead } from '../../../components/ui/section-head';
import { paths } from '../../../lib/paths';
import { freeName, isLayerDraft } from '../lib/draft-rules';
import { useDraftInHand } from './draft-layout';
import { EntryTable } from './entry-table';

type Entry = Record<string, unknown>;

/** What the rules refer to: limit tables, and the agency's own attributes, quantities and documents. */
export function DraftEntries() {
  return (
    <>
      <Tables />
      <EntryTable
        list="attributes"
        nameField="name"
        title="Attributes"
        about="properties of a mix that rules branch on, beside those of every rule set"
        columns={[
          { field: 'label', label: 'Label', kind: 'text' },
          { field: 'type', label: 'Type', kind: 'choice', choices: ['number', 'text', 'boolean', 'date'] },
          { field: 'unit', label: 'Unit', kind: 'text' },
          { field: 'values', label: 'Allowed values', kind: 'list' },
          { field: 'aliases', label: 'Also called', kind: 'list' },
        ]}
        fresh={{ type: 'text' }}
      />
      <EntryTable
        list="quantities"
        nameField="id"
        title="Quantities"
        about="that this rule set declares, beside those of every rule set"
        columns={[
          { field: 'symbol', label: 'Symbol', kind: 'text' },
          { field: 'label', label: 'Label', kind: 'text' },
          { field: 'unit', label: 'Unit', kind: 'text' },
          { field: 'decimals', label: 'Decimals', kind: 'number' },
          { field: 'plausible', label: 'Plausible from and to', kind: 'range' },
          { field: 'aliases', label: 'Also called', kind: 'list' },
        ]}
        fresh={{ symbol: 'X', label: 'new quantity', unit: '%' }}
      />
      <EntryTable
        list="documents"
        nameField="type"
        title="Documents"
        about="that rules may ask for, beside those of every rule set"
        columns={[{ field: 'label', label: 'Label', kind: 'text' }]}
        fresh={{ label: 'New document' }}
      />
    </>
  );
}

function Tables() {
  const { editing } = useDraftInHand();
  const { draft, document, change } = editing;
  const navigate = useNavigate();
  const isLayer = isLayerDraft(draft.document);
  const tables = [...partsOf(document)].filter(([part]) => /^(add\.|replace\.)?tables\//.test(part));
  const ids = tables.map(([, table]) => String((table as Entry).id));
  const add = () => {
    const id = freeName(ids, 'new-table');
    const columns = [{ name: 'min', unit: '%' }];
    const after = { id, title: 'New table', keys: ['nominalMaximumSize'], columns, rows: [] };
    change([{ part: `${isLayer ? 'add.tables' : 'tables'}/${id}`, after }]);
    void navigate(paths.draftTable(draft.ruleSet, draft.id, id));
  };
  return (
    <>
      <SectionHead
        title="Limit tables"
        about="limits as rules look them up"
        acts={
          draft.abilities.change ? (
            <Button kind="text" onPress={add}>
              Add a table
            </Button>
          ) : null
        }
      />
      <ul className="entry-list">
        {tables.map(([part, table]) => {
          const { id, title, rows } = table as Entry;
          return (
            <li key={part}>
              <Link to={paths.draftTable(draft.ruleSet, draft.id, String(id))}>{String(title ?? id)}</Link>{' '}
              <small className="mute">{Array.isArray(rows) ? rows.length : 0} rows</small>
            </li>
          );
        })}
      </ul>
    </>
  );
}
