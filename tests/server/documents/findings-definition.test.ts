import { describe, expect, it } from 'vitest';
import { findingsDefinition } from '#server/documents/findings-definition';
import { aDocumentInput } from '#tests/builders/a-document-input';
import { aFinding } from '#tests/builders/a-finding';

/** Headings of groups are the only runs that are bold at 9.5 points. */
const headingsOf = (definition: unknown): string[] =>
  [...JSON.stringify(definition).matchAll(/"bold":true,"fontSize":9\.5,"text":"([^"]*)"/g)].map(
    ([, heading]) => heading ?? '',
  );

describe('the findings as a document', () => {
  it('groups by section as the ledger does, however deep a clause goes', () => {
    const input = aDocumentInput({
      findings: [
        aFinding({ rule: 'a', clause: '412.03(b)(1)' }),
        aFinding({ rule: 'b', clause: '412.03(b)(2)' }),
        aFinding({ rule: 'c', clause: '412.03(c)' }),
        aFinding({ rule: 'd', clause: '412.04(a)' }),
        aFinding({ rule: 'e', clause: null }),
      ],
    });
    expect(headingsOf(findingsDefinition(input).content)).toEqual(['412.03', '412.04', 'Does not add up']);
  });
});
