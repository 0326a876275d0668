import type { Said } from '#rules/reading/correction';
import { unitWord } from '#shared/format/units';
import type { ReadingChoices } from '../api/get-reading-choices';
import { atWords } from './at-words';
import { conditionLabels } from './condition-words';

/** "is Gmb, trial B, in g/cm³", read after the cells that it is said of. */
export function saidWords(says: Said, choices: ReadingChoices | undefined): string {
  switch (says.kind) {
    case 'not a reading':
      return 'is not a reading';
    case 'attribute': {
      const attribute = choices?.attributes.find(({ name }) => name === says.name);
      return `is ${attribute?.label ?? says.name}`;
    }
    case 'document date': {
      const document = choices?.documents.find(({ type }) => type === says.type);
      const date = says.part === 'validTo' ? 'the last valid day' : 'the date';
      return `is ${date} of ${document?.label ?? says.type}`;
    }
    case 'reading': {
      const quantity = choices?.quantities.find(({ id }) => id === says.quantity);
      const unit = says.unit === null ? '' : unitWord(says.unit);
      const parts = [
        quantity?.label ?? says.quantity,
        atWords(says.at),
        unit === '' ? '' : `in ${unit}`,
        says.without.length === 0
          ? ''
          : `without ${says.without.map((name) => conditionLabels[name].toLowerCase()).join(', ')}`,
      ];
      return `is ${parts.filter((part) => part !== '').join(', ')}`;
    }
  }
}
