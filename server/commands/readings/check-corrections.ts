import type { Quantity } from '#rules/quantities/quantity';
import { convert, normaliseUnit } from '#rules/quantities/units';
import type { CellGrid } from '#rules/reading/cell-grid';
import type { Correction, Said } from '#rules/reading/correction';
import { blockOf } from '#rules/reading/layout/tell-corrections';
import { submittalFacts } from '#rules/reading/submittal-facts';
import { withStandardAttributes } from '#rules/rule-sets/attribute';
import { withStandardDocuments } from '#rules/rule-sets/document-types';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { ProblemError } from '#shared/contracts/problems';
import { quantitiesFor, unitsOf } from '../../presenters/words-for';

/** Every fault of corrections at once: a sheet or cells that are not there, and what the section has no word for. */
export function checkCorrections(
  corrections: readonly Correction[],
  { grid, edition }: { grid: CellGrid; edition: ResolvedEdition },
): ProblemError[] {
  return corrections.flatMap((correction, index) => {
    const pointer = `/corrections/${index}`;
    return [
      ...placeFaults(correction, grid, pointer),
      ...saidFaults(correction.says, edition, `${pointer}/says`),
    ];
  });
}

function placeFaults({ sheet, range }: Correction, grid: CellGrid, pointer: string): ProblemError[] {
  const found = grid.sheets.find(({ name }) => name === sheet);
  if (found === undefined) {
    const fix = `Choose one of ${grid.sheets.map(({ name }) => name).join(', ')}.`;
    return [{ pointer: `${pointer}/sheet`, detail: `The workbook has no sheet “${sheet}”.`, fix }];
  }
  const block = blockOf(range);
  const holds = found.cells.some(
    ({ row, column }) =>
      block !== null &&
      row >= block.top &&
      row <= block.bottom &&
      column >= block.left &&
      column <= block.right,
  );
  if (holds) return [];
  const detail = `${sheet === '' ? range : `${sheet} ${range}`} holds nothing.`;
  return [{ pointer: `${pointer}/range`, detail, fix: 'Choose cells that hold something.' }];
}

function saidFaults(says: Said, edition: ResolvedEdition, pointer: string): ProblemError[] {
  switch (says.kind) {
    case 'reading': {
      const quantity = quantitiesFor(edition).get(says.quantity);
      if (quantity === undefined) return [unknownQuantity(says.quantity, `${pointer}/quantity`)];
      return says.unit === null ? [] : unitFaults(says.unit, quantity, `${pointer}/unit`);
    }
    case 'attribute': {
      const known = [...withStandardAttributes(edition.attributes), ...submittalFacts];
      if (known.some(({ name }) => name === says.name)) return [];
      const detail = `The section knows no attribute “${says.name}”.`;
      return [{ pointer: `${pointer}/name`, detail, fix: 'Choose one that it knows.' }];
    }
    case 'document date': {
      if (withStandardDocuments(edition.documents).some(({ type }) => type === says.type)) return [];
      const detail = `The section knows no document “${says.type}”.`;
      return [{ pointer: `${pointer}/type`, detail, fix: 'Choose a kind of document that it knows.' }];
    }
    case 'not a reading':
      return [];
  }
}

export function unknownQuantity(id: string, pointer: string): ProblemError {
  return { pointer, detail: `There is no quantity “${id}”.`, fix: 'Choose one of the register.' };
}

/** A percentage may stand as a fraction of one, which is no other unit but another way to write it. */
export function unitFaults(unit: string, quantity: Quantity, pointer: string): ProblemError[] {
  if (unit === '1' && quantity.unit === '%') return [];
  if (normaliseUnit(unit) !== null && convert(1, unit, quantity.unit).ok) return [];
  return [
    {
      pointer,
      detail: `${quantity.symbol} cannot be in ${unit}.`,
      fix: `Choose one of ${unitsOf(quantity).join(', ')}.`,
    },
  ];
}
