import { attributeFromScalar } from '#rules/reading/understand-attribute';
import { type AttributeDefinition, type Scalar, withStandardAttributes } from '#rules/rule-sets/attribute';
import type { ProblemError } from '#shared/contracts/problems';
import { Problem } from '../../problem';
import { attributeFault } from '../readings/attribute-fault';

type Facts = Record<string, Scalar>;

interface Understanding {
  /** Each with the attributes that it declares: the project's sections, or what may become one. */
  editions: readonly { attributes: AttributeDefinition[] }[];
  /** `every` edition that knows the attribute has to understand its value, or `some` one. */
  by: 'every' | 'some';
}

/** What a project states, in the words and units of the editions that will use it, or every fault at its field. */
export function understandFacts(facts: Facts, { editions, by }: Understanding): Facts {
  const known = editions.map(({ attributes }) => withStandardAttributes(attributes));
  const errors: ProblemError[] = [];
  const understood: Facts = {};
  for (const [name, value] of Object.entries(facts)) {
    const pointer = `/facts/${name}`;
    const readings = known.flatMap((each) =>
      each
        .filter((attribute) => attribute.name === name)
        .map((attribute) => ({ attribute, meant: attributeFromScalar(attribute, value, null) })),
    );
    const misread = readings.find(({ meant }) => meant === null);
    const read = readings.find(({ meant }) => meant !== null);
    if (readings.length === 0) {
      const detail = `No edition that judges this project knows the attribute ${name}.`;
      errors.push({ pointer, detail, fix: 'Leave it empty.' });
    } else if (misread !== undefined && (by === 'every' || read === undefined)) {
      errors.push(attributeFault(misread.attribute, { value, pointer }));
    }
    understood[name] = read?.meant ?? value;
  }
  if (errors.length > 0) throw new Problem('invalid-input', { detail: errors[0]?.detail ?? '', errors });
  return understood;
}
