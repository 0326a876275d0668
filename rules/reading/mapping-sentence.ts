import type { Quantity } from '../quantities/quantity';
import { type AttributeDefinition, attributeLabel } from '../rule-sets/attribute';
import type { Said } from './correction';
import { saidByRule } from './layout/mapping-says';
import type { MappingRule } from './mapping';
import { conditionsInWords } from './take-words';

export interface WordsFor {
  quantity: (id: string) => Pick<Quantity, 'symbol' | 'unit'> | undefined;
  attribute: (name: string) => AttributeDefinition | undefined;
  document: (type: string) => string | undefined;
}

/** "Under “Bulk SG”: Gmb, in g/cm³" */
export function mappingSentence(rule: MappingRule, words: WordsFor): string {
  const { sheet, header, under } = rule.anchor;
  const place = rule.axis === 'right' ? 'Beside' : 'Under';
  const column = under === undefined ? '' : ` and under ${under.map((each) => `“${each}”`).join(', ')}`;
  const on = sheet === null || sheet === '' ? '' : ` on ${sheet}`;
  const said = saidByRule(rule);
  const what = said === null ? 'read by what stands beside it' : saidInWords(said, words);
  return `${place} ${header.map((each) => `“${each}”`).join(', ')}${column}${on}: ${what}.`;
}

/** "Gmb, trial B, in g/cm³" */
export function saidInWords(said: Said, words: WordsFor): string {
  switch (said.kind) {
    case 'reading': {
      const quantity = words.quantity(said.quantity);
      const name = quantity?.symbol ?? said.quantity;
      const unit = unitInWords(said.unit, quantity?.unit ?? null);
      const without = said.without.map((name) => `without ${name}`);
      return [name, ...conditionsInWords(said.at), ...unit, ...without].join(', ');
    }
    case 'attribute': {
      const attribute = words.attribute(said.name);
      return attribute ? attributeLabel(attribute).toLowerCase() : said.name;
    }
    case 'document date': {
      const document = (words.document(said.type) ?? said.type).toLowerCase();
      return said.part === 'date'
        ? `the date of the ${document}`
        : `the day until which the ${document} is valid`;
    }
    case 'not a reading':
      return 'not a reading';
  }
}

/** A percentage that stands as 0.05 is written as a fraction; a number without a unit has none to be told. */
function unitInWords(unit: string | null, canonical: string | null): string[] {
  if (unit === null) return [];
  if (unit !== '1') return [`in ${unit}`];
  return canonical === '%' ? ['as a fraction of one'] : [];
}
