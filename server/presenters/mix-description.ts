import type { AttributeValue } from '#rules/record';

type Attributes = Record<string, Pick<AttributeValue, 'value'>>;

/** "12.5 mm dense-graded surface course · PG 64-22 · 12 million ESAL", of what the attributes tell. */
export function mixDescription(attributes: Attributes): string {
  const text = (name: string) => {
    const value = attributes[name]?.value;
    return value === undefined || typeof value === 'boolean' ? null : String(value);
  };
  const size = text('nominalMaximumSize');
  const course = text('course');
  const mix = [
    size === null ? null : `${size} mm`,
    text('mixType'),
    course === null ? null : course.replace(/\s*(course|layer)$/i, ' course').replace(/^(\S+)$/, '$1 course'),
  ];
  const traffic = text('designTraffic');
  return [
    mix.filter((part) => part !== null).join(' '),
    text('binderGrade'),
    traffic === null ? null : `${traffic} million ESAL`,
  ]
    .filter((part) => part !== null && part !== '')
    .join(' · ');
}
