import { z } from 'zod';
import { limits } from '../limits';
import { endpoint } from './endpoint';

export const searchResultSchema = z.strictObject({
  kind: z.enum(['submittal', 'project', 'clause']),
  title: z.string(),
  detail: z.string(),
  /** An address of the product, `/submittals/…`. */
  href: z.string(),
});

export const search = endpoint({
  method: 'get',
  path: '/api/search',
  summary: 'Find submittals, projects and clauses of the active organisation',
  query: z.strictObject({ q: z.string().trim().min(1).max(limits.searchCharacters) }),
  response: z.strictObject({ results: z.array(searchResultSchema) }),
});

export type SearchResult = z.infer<typeof searchResultSchema>;
