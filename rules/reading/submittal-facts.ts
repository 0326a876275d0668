import type { AttributeDefinition } from '../rule-sets/attribute';

/** What a submittal says of itself, beside the attributes that rules branch on. */
export const submittalFacts: AttributeDefinition[] = [
  {
    name: 'mixDesignation',
    label: 'Mix designation',
    type: 'text',
    aliases: ['mix number', 'mix id', 'JMF number'],
  },
  {
    name: 'laboratory',
    label: 'Laboratory',
    type: 'text',
    aliases: ['testing laboratory', 'laboratory name'],
  },
];
