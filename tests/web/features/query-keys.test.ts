import { describe, expect, it } from 'vitest';
import { caughtMailQuery } from '../../../web/features/caught-mail/api/caught-mail';
import { checksQuery, keptCheckQuery } from '../../../web/features/checks/api/kept-checks';
import { creepQuery } from '../../../web/features/creep/api/get-creep';
import { queueQuery } from '../../../web/features/queue/api/get-queue';
import { queueItemQuery } from '../../../web/features/queue/api/get-queue-item';
import { documentTypesQuery } from '../../../web/features/reading/api/get-document-types';
import { readingQuery } from '../../../web/features/reading/api/get-reading';
import { letterQuery } from '../../../web/features/return/api/get-letter';
import { returnQuery } from '../../../web/features/return/api/get-return';
import { returnMailQuery } from '../../../web/features/return/api/get-return-mail';
import { returnedNotesQuery } from '../../../web/features/return/api/list-returned-notes';
import { submittalsQuery } from '../../../web/features/submittals/api/list-submittals';
import { submittalQuery } from '../../../web/features/upload/api/get-submittal';
import { projectQuery, projectsQuery } from '../../../web/lib/queries/projects-query';
import { revisionKey } from '../../../web/lib/queries/revision-query';

const one = { submittalId: 's1', number: 1 };
const two = { submittalId: 's1', number: 2 };

describe('query keys of the pages', () => {
  it.each([
    ['queue', [queueQuery({ who: 'mine', by: 'due' }), queueQuery({ who: 'mine', by: 'project' })]],
    ['queue item', [queueItemQuery('s1'), queueItemQuery('s2')]],
    ['submittals', [submittalsQuery({}), submittalsQuery({ state: 'draft' }), submittalsQuery({ q: 'BW' })]],
    ['submittal', [submittalQuery('s1'), submittalQuery('s2')]],
    ['project', [projectsQuery(), projectQuery('p1'), projectQuery('p2')]],
    ['checks', [checksQuery(one), checksQuery(two), keptCheckQuery(one, 1), keptCheckQuery(one, 2)]],
    ['creep', [creepQuery(one), creepQuery(two)]],
    ['reading', [readingQuery(one), readingQuery(two)]],
    ['document types', [documentTypesQuery(one), documentTypesQuery(two)]],
    ['return', [returnQuery(one), returnQuery(two)]],
    ['letter', [letterQuery(one, 1), letterQuery(one, 2), letterQuery(two, 1)]],
    ['mail of a return', [returnMailQuery(one, 1), returnMailQuery(one, 2)]],
    ['returned notes', [returnedNotesQuery(one), returnedNotesQuery(two)]],
    ['caught mail', [caughtMailQuery('m1'), caughtMailQuery('m2')]],
  ])('of the %s hold every input', (_, queries) => {
    const texts = queries.map(({ queryKey }) => JSON.stringify(queryKey));
    expect(new Set(texts).size).toBe(queries.length);
  });

  it('of what hangs on a revision are renewed by its prefix', () => {
    const prefix = revisionKey(one);
    for (const { queryKey } of [readingQuery(one), returnQuery(one), returnedNotesQuery(one)]) {
      expect(queryKey.slice(0, prefix.length)).toEqual(prefix);
    }
  });
});
