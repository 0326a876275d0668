import type { AttributeValue } from '../record';
import type { AttributeDefinition } from '../rule-sets/attribute';
import { attributeLabel } from '../rule-sets/attribute';
import type { Cell } from './cell-grid';
import { isReference } from './mapping';
import type { RuleAtAnchor } from './read-rule';
import { placeOf, type ReadingContext } from './reading-log';
import { understandAttribute } from './understand-attribute';
import { unreadReasons } from './unread-reason';

/** Reads the cell beside an attribute's label. */
export function readAttribute(
  bound: RuleAtAnchor,
  cell: Cell,
  attribute: AttributeDefinition,
  context: ReadingContext,
): void {
  const { index, rule, anchor, locators } = bound;
  const { log, grid } = context;
  const place = placeOf(index.sheet, cell);
  const unitCell = isReference(rule.unit) ? locators.get('unit')?.cellFor(cell) : undefined;
  const stated = unitCell?.text.trim() || anchor.unit || (isReference(rule.unit) ? null : rule.unit);
  const build = (value: AttributeValue['value']): AttributeValue => ({
    value,
    ...(attribute.unit ? { unit: attribute.unit } : {}),
    origin: 'reported',
    source: place,
  });
  const understood = understandAttribute(attribute, cell, stated ?? null, grid.date1904);
  const about = { attribute: attribute.name };
  const settled = log.settle(place, understood, about, (value) => ({
    attribute: { name: attribute.name, value: build(value) },
  }));
  if (settled.state === 'none') log.passOver(place, unreadReasons.noValue);
  if (settled.state === 'left out') log.passOver(place, unreadReasons.leftOut);
  if (settled.state !== 'value') return;
  log.use(place, 'read', `${attributeLabel(attribute)}: ${String(settled.value)}.`);
  log.attributes.push({ name: attribute.name, value: build(settled.value), place });
}
