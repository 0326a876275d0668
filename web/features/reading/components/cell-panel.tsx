import { useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { FieldErrorLine } from '../../../components/ui/field';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { TextField } from '../../../components/ui/text-field';
import { asProblem } from '../../../lib/problem';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useReadingChoices } from '../api/get-reading-choices';
import type { ChosenCells } from '../hooks/use-chosen-cells';
import type { ReadingActs } from '../hooks/use-reading-acts';
import { type SheetRows, useSheetRows } from '../hooks/use-sheet-rows';
import type { CellRange } from '../lib/cell-address';
import { blockText, cellCount, parseBlock } from '../lib/cell-block';
import { anAct } from '../lib/reading-act';
import { emptySayForm, type SayForm, sayingOf } from '../lib/say-form';
import { takenForm } from '../lib/taken-form';
import { CellFacts } from './cell-facts';
import { Proposal } from './proposal';
import { SayFields } from './say-fields';

/** What the chosen cells were taken for and why, and what a person says they are. */
export function CellPanel({
  params,
  reading,
  chosen,
  acts,
  onClose,
}: {
  params: RevisionParams;
  reading: ReadingView;
  chosen: ChosenCells;
  acts: ReadingActs;
  onClose: () => void;
}) {
  const { cursor, block } = chosen;
  const choices = useReadingChoices(params);
  const rows = useSheetRows(params, cursor.sheet, rowsNamed(block));
  const [form, setForm] = useState<SayForm | null>(null);
  const shown = form ?? takenForm(emptySayForm, rows, block, choices.data);
  const saying = form === null ? null : sayingOf(form, { sheet: cursor.sheet, block, cellAt: cellIn(rows) });
  const range = blockText(block);
  const keep = () => {
    if (saying?.ok !== true) return;
    acts.keep(anAct({ corrections: saying.corrections }), `what ${range} is`, () => setForm(null));
  };
  return (
    <section
      className="cell-panel"
      aria-labelledby="cell-panel"
      onKeyDown={(event) => {
        if (event.defaultPrevented) return;
        if (event.key === 'Escape') onClose();
        else if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) keep();
        else return;
        event.preventDefault();
      }}
    >
      <div className="side-head">
        <h2 id="cell-panel" tabIndex={-1}>
          {cellCount(block) > 1 ? `What are ${range}?` : `What is ${range}?`}
        </h2>
        <span>{cellCount(block) > 1 ? countInFigures(cellCount(block), 'cell') : cursor.sheet}</span>
      </div>
      <CellFacts reading={reading} sheet={cursor.sheet} block={block} rows={rows} />
      <BlockField key={range} range={range} onChoose={chosen.choose} />
      {choices.data ? (
        <SayFields choices={choices.data} form={shown} onChange={setForm} />
      ) : choices.error ? (
        <ProblemNotice problem={asProblem(choices.error)} unaffected="What was read still stands." />
      ) : null}
      {saying?.ok === false && saying.fault ? <FieldErrorLine>{saying.fault}</FieldErrorLine> : null}
      {saying?.ok ? (
        <Proposal
          params={params}
          version={reading.version}
          act={anAct({ corrections: saying.corrections })}
          keepLabel="Keep it"
          keyHint="Ctrl Enter"
          onKeep={keep}
          onLeave={onClose}
          isKeeping={acts.isPending}
        />
      ) : (
        <div className="acts pt-2">
          <Button kind="text" onPress={onClose}>
            Leave it as it is
          </Button>
        </div>
      )}
    </section>
  );
}

/** A block can be typed, too, by whoever cannot drag. */
function BlockField({ range, onChoose }: { range: string; onChoose: (block: CellRange) => void }) {
  const [text, setText] = useState(range);
  const block = parseBlock(text);
  const choose = () => {
    if (block && blockText(block) !== range) onChoose(block);
  };
  return (
    <TextField
      label="Cells"
      value={text}
      onChange={setText}
      onBlur={choose}
      onKeyDown={(event) => {
        if (event.key === 'Enter') choose();
      }}
      error={block ? undefined : 'Enter a block such as D6:D17.'}
      size="number"
    />
  );
}

const mostRowsNamed = 2000;

/** Rows that may name trials or specimens: those of the block, and those above it where headings stand. */
function rowsNamed({ from, to }: CellRange): { first: number; last: number } {
  return { first: Math.max(from.row - 20, 1), last: Math.min(to.row, from.row + mostRowsNamed) };
}

function cellIn(rows: SheetRows) {
  return ({ row, column }: { row: number; column: number }) => rows.rowAt(row)?.cells.get(column);
}
