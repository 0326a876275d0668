import { type ClipboardEvent, type KeyboardEvent, useRef, useState } from 'react';
import { Link } from 'react-router-dom';
import { tablesOf } from '#rules/rule-sets/tables-of';
import { Button } from '../../../components/ui/button';
import { Field } from '../../../components/ui/field';
import { Sideways } from '../../../components/ui/sideways';
import { TextField } from '../../../components/ui/text-field';
import { announce } from '../../../lib/announce';
import { paths } from '../../../lib/paths';
import { cellText, type ReadCell, readKey, readLimit, rowsOfText, textOfRows } from '../lib/table-text';
import { useDraftInHand } from './draft-layout';

type Table = Record<string, unknown>;
type Row = Record<string, unknown>;
interface Column {
  name: string;
  unit?: string;
}

/** A table as a grid: arrows move, Enter goes down, a copied block is pasted where the cursor stands. */
export function TableEditor({ part, table }: { part: string; table: Table }) {
  const { editing } = useDraftInHand();
  const mayChange = editing.draft.abilities.change;
  const set = (fields: Table) => editing.change([{ part, after: { ...table, ...fields } }]);
  const keys = listIn<string>(table.keys);
  const columns = listIn<Column>(table.columns);
  const rows = listIn<Row>(table.rows);
  return (
    <>
      <div className="fieldset">
        <TextField
          label="Title"
          size="wide"
          value={String(table.title ?? '')}
          onChange={(title) => set({ title })}
          isDisabled={!mayChange}
        />
        <NamesField
          label="Looked up by"
          help="attributes, and sieve; separated by commas"
          names={keys}
          isDisabled={!mayChange}
          onChange={(next) => next.length > 0 && set({ keys: next })}
        />
        <NamesField
          label="Columns"
          help="each with its unit after it, such as min %"
          names={columns.map(({ name, unit }) => (unit === undefined ? name : `${name} ${unit}`))}
          isDisabled={!mayChange}
          onChange={(next) => next.length > 0 && set({ columns: next.map(columnOf) })}
        />
        <Field label="Used by">
          <UsedBy table={String(table.id)} />
        </Field>
      </div>
      <Grid
        names={[...keys, ...columns.map(({ name }) => name)]}
        keys={keys.length}
        heads={[...keys, ...columns.map(({ name, unit }) => (unit ? `${name}, ${unit}` : name))]}
        rows={rows}
        mayChange={mayChange}
        onChange={(next) => set({ rows: next })}
      />
    </>
  );
}

function columnOf(text: string): Column {
  const [name = '', ...unit] = text.trim().split(/\s+/);
  return unit.length === 0 ? { name } : { name, unit: unit.join(' ') };
}

/** Typed as one line; taken over when it is left. */
function NamesField({
  label,
  help,
  names,
  isDisabled,
  onChange,
}: {
  label: string;
  help: string;
  names: readonly string[];
  isDisabled: boolean;
  onChange: (names: string[]) => void;
}) {
  const [typed, setTyped] = useState<string | null>(null);
  return (
    <TextField
      label={label}
      size="wide"
      value={typed ?? names.join(', ')}
      onChange={setTyped}
      onBlur={() => {
        if (typed !== null)
          onChange(
            typed
              .split(',')
              .map((name) => name.trim())
              .filter(Boolean),
          );
        setTyped(null);
      }}
      isDisabled={isDisabled}
      help={help}
    />
  );
}

function UsedBy({ table }: { table: string }) {
  const { checked, editing } = useDraftInHand();
  const { draft } = editing;
  const users = checked.ok ? checked.edition.rules.filter((rule) => tablesOf(rule).has(table)) : [];
  if (users.length === 0) return <span className="mute">no rule yet</span>;
  return users.map((rule, index) => (
    <span key={rule.id}>
      {index > 0 ? ', ' : ''}
      <Link to={paths.draftRule(draft.ruleSet, draft.id, rule.id)}>{rule.clause}</Link>
    </span>
  ));
}

interface GridProps {
  names: readonly string[];
  /** How many of the names are keys. */
  keys: number;
  heads: readonly string[];
  rows: readonly Row[];
  mayChange: boolean;
  onChange: (rows: Row[]) => void;
}

function Grid({ names, keys, heads, rows, mayChange, onChange }: GridProps) {
  const frame = useRef<HTMLTableElement>(null);
  const [faults, setFaults] = useState<ReadonlyMap<string, { text: string; detail: string }>>(new Map());
  const write = (at: { row: number; column: number }, block: readonly (readonly string[])[]) => {
    const next = rows.map((row) => ({ ...row }));
    const left = new Map(faults);
    block.forEach((texts, down) => {
      texts.forEach((text, across) => {
        const name = names[at.column + across];
        if (name === undefined) return;
        const row = at.row + down;
        const read = readCell(text, at.column + across < keys);
        if (read.ok) left.delete(`${row} ${name}`);
        else left.set(`${row} ${name}`, { text, detail: read.detail });
        while (next.length <= row) next.push({});
        if (read.ok) (next[row] as Row)[name] = read.cell;
      });
    });
    setFaults(left);
    onChange(next);
  };
  const focus = (row: number, column: number) =>
    frame.current?.querySelector<HTMLInputElement>(`[data-cell="${row} ${column}"]`)?.focus();
  return (
    <>
      <Sideways label="Rows of the table">
        <table ref={frame} className="table table-head-over limit-grid">
          <caption className="hidden-text">Rows of the table</caption>
          <thead>
            <tr>
              {heads.map((head) => (
                <th key={head} scope="col">
                  {head}
                </th>
              ))}
              {mayChange ? <th scope="col">Acts</th> : null}
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: a row has no name but its place.
              <tr key={index}>
                {names.map((name, column) => (
                  <td key={name}>
                    <GridCell
                      label={`${heads[column]}, row ${index + 1}`}
                      place={`${index} ${column}`}
                      text={cellText(row[name] as never)}
                      fault={faults.get(`${index} ${name}`) ?? null}
                      isReadOnly={!mayChange}
                      onWrite={(text) => write({ row: index, column }, [[text]])}
                      onPaste={(block) => {
                        write({ row: index, column }, block);
                        announce(`${block.length} rows pasted.`);
                      }}
                      onMove={(down, across) => focus(index + down, column + across)}
                    />
                  </td>
                ))}
                {mayChange ? (
                  <td>
                    <Button
                      kind="inline"
                      onPress={() => onChange(rows.filter((_, each) => each !== index))}
                      aria-label={`Remove row ${index + 1}`}
                    >
                      Remove
                    </Button>
                  </td>
                ) : null}
              </tr>
            ))}
          </tbody>
        </table>
      </Sideways>
      <div className="acts pt-2">
        {mayChange ? (
          <>
            <Button kind="text" onPress={() => onChange([...rows, {}])}>
              Add a row
            </Button>
            <PasteRows onPaste={(block) => write({ row: 0, column: 0 }, block)} />
          </>
        ) : null}
        <Button
          kind="text"
          onPress={() => {
            const block = rows.map((row) => names.map((name) => cellText(row[name] as never)));
            void navigator.clipboard.writeText(textOfRows([heads, ...block])).then(
              () => announce('The table is copied.'),
              () => announce('The browser does not let this page copy.'),
            );
          }}
        >
          Copy the table
        </Button>
      </div>
    </>
  );
}

function readCell(text: string, isKey: boolean): ReadCell {
  return isKey ? readKey(text) : readLimit(text);
}

function GridCell({
  label,
  place,
  text,
  fault,
  isReadOnly,
  onWrite,
  onPaste,
  onMove,
}: {
  label: string;
  place: string;
  text: string;
  fault: { text: string; detail: string } | null;
  isReadOnly: boolean;
  onWrite: (text: string) => void;
  onPaste: (block: string[][]) => void;
  onMove: (down: number, across: number) => void;
}) {
  const [typed, setTyped] = useState<string | null>(null);
  const shown = typed ?? fault?.text ?? text;
  const keep = () => {
    if (typed !== null && typed !== text) onWrite(typed);
    setTyped(null);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Escape') setTyped(null);
    const step = steps[event.key];
    if (step === undefined || event.shiftKey || event.ctrlKey) return;
    event.preventDefault();
    keep();
    onMove(...step);
  };
  const takePaste = (event: ClipboardEvent<HTMLInputElement>) => {
    const block = rowsOfText(event.clipboardData.getData('text/plain'));
    if (isReadOnly || (block.length === 1 && block[0]?.length === 1)) return;
    event.preventDefault();
    setTyped(null);
    onPaste(block);
  };
  return (
    <>
      <input
        className="input grid-input"
        aria-label={label}
        aria-invalid={fault !== null && typed === null}
        data-cell={place}
        readOnly={isReadOnly}
        value={shown}
        onChange={(event) => setTyped(event.target.value)}
        onBlur={keep}
        onKeyDown={onKeyDown}
        onPaste={takePaste}
      />
      {fault !== null && typed === null ? <span className="field-error">{fault.detail}</span> : null}
    </>
  );
}

const steps: Record<string, [down: number, across: number]> = {
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
  Enter: [1, 0],
};

/** For a table whose rows are not there yet: the whole block at once. */
function PasteRows({ onPaste }: { onPaste: (block: string[][]) => void }) {
  const [text, setText] = useState<string | null>(null);
  if (text === null) {
    return (
      <Button kind="text" onPress={() => setText('')}>
        Paste from a spreadsheet
      </Button>
    );
  }
  return (
    <div className="paste-rows">
      <TextField
        label="Rows from a spreadsheet or a document’s table, without its head"
        rows={5}
        value={text}
        onChange={setText}
        autoFocus
      />
      <div className="acts pt-2">
        <Button
          isDisabled={text.trim() === ''}
          onPress={() => {
            onPaste(rowsOfText(text));
            setText(null);
          }}
        >
          Put the rows in
        </Button>
        <Button kind="text" onPress={() => setText(null)}>
          Leave it
        </Button>
      </div>
    </div>
  );
}

function listIn<Item>(value: unknown): Item[] {
  return Array.isArray(value) ? value : [];
}
