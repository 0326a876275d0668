import { useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { changeSection, confirmSection, type Section } from '#shared/contracts/projects';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { useKeepProject } from './change-project';

export type SectionChoice = z.input<NonNullable<typeof confirmSection.body>>;

export function useConfirmSection(projectId: string) {
  const keep = useKeepProject();
  const act = useActKey();
  return async (choice: SectionChoice) => {
    const project = await call(confirmSection, {
      params: { projectId },
      body: choice,
      idempotencyKey: act.keyFor(choice),
    });
    act.done();
    return keep(project);
  };
}

/** Checks made under the section before become stale, so every revision is asked for again. */
export function useChangeSection(projectId: string) {
  const client = useQueryClient();
  const keep = useKeepProject();
  return async ({ id, version }: Pick<Section, 'id' | 'version'>, choice: SectionChoice) => {
    const project = await call(changeSection, {
      params: { projectId, sectionId: id },
      body: choice,
      version,
    });
    await client.invalidateQueries({ queryKey: ['submittals'] });
    return keep(project);
  };
}
