import { z } from 'zod';
import type { PartChange } from '#rules/authoring/document-parts';
import { partChangeSchema } from '#shared/contracts/drafts';

const keptSchema = z.array(partChangeSchema.extend({ after: z.unknown() }));

const nameOf = (draftId: string) => `clauseway.draft-changes.${draftId}`;

/** Changes that the server has not kept yet outlive a closed tab and a lost network here. */
export function keepChanges(draftId: string, changes: readonly PartChange[]): void {
  try {
    if (changes.length === 0) localStorage.removeItem(nameOf(draftId));
    else localStorage.setItem(nameOf(draftId), JSON.stringify(changes));
  } catch {
    // Without storage they live as long as the page, which says that they are not saved yet.
  }
}

export function keptChanges(draftId: string): PartChange[] {
  try {
    const parsed = keptSchema.safeParse(JSON.parse(localStorage.getItem(nameOf(draftId)) ?? '[]'));
    return parsed.success ? parsed.data.map((change) => ({ ...change, after: change.after ?? null })) : [];
  } catch {
    return [];
  }
}
