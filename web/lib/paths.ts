/** Every address of the product is made here: pages link by these, the router matches the same patterns. */
export const paths = {
  home: '/',
  signIn: '/sign-in',
  setUp: (token: string) => `/set-up/${encodeURIComponent(token)}`,
  invitation: (token: string) => `/invitations/${encodeURIComponent(token)}`,
  forgotPassword: '/forgotten-password',
  resetPassword: (token: string) => `/new-password/${encodeURIComponent(token)}`,
  chooseOrganisation: '/organisations',
  queue: '/queue',
  submittals: '/submittals',
  upload: '/submittals/new',
  revision: (submittalId: string, number: number) => `/submittals/${submittalId}/r/${number}`,
  reading: (submittalId: string, number: number, at?: { sheet: string; cell?: string }) =>
    `/submittals/${submittalId}/r/${number}/reading${searchOf(at)}`,
  gradation: (submittalId: string, number: number) => `/submittals/${submittalId}/r/${number}/gradation`,
  creep: (submittalId: string, number: number, temperature?: number) =>
    `/submittals/${submittalId}/r/${number}/creep${searchOf(
      temperature === undefined ? undefined : { temperature: String(temperature) },
    )}`,
  room: (submittalId: string, number: number) => `/submittals/${submittalId}/r/${number}/room`,
  return: (submittalId: string, number: number) => `/submittals/${submittalId}/r/${number}/return`,
  checks: (submittalId: string, number: number) => `/submittals/${submittalId}/r/${number}/checks`,
  keptCheck: (submittalId: string, number: number, check: number) =>
    `/submittals/${submittalId}/r/${number}/checks/${check}`,
  workbook: (submittalId: string, number: number) => `/submittals/${submittalId}/r/${number}/workbook`,
  nextRevision: (submittalId: string) => `/submittals/${submittalId}/next`,
  projects: '/projects',
  newProject: '/projects/new',
  project: (projectId: string) => `/projects/${projectId}`,
  changeProject: (projectId: string) => `/projects/${projectId}/change`,
  ruleSets: '/rule-sets',
  ruleSet: (ruleSetId: string, edition: string, layers: readonly string[] = []) =>
    `/rule-sets/${encodeURIComponent(ruleSetId)}/${encodeURIComponent(edition)}${searchOf(
      layers.length > 0 ? { layers: layers.join(',') } : undefined,
    )}`,
  newDraft: (from?: { ruleSet: string; edition: string }) => `/rule-sets/new-draft${searchOf(from)}`,
  draft: (ruleSetId: string, draftId: string) =>
    `/rule-sets/${encodeURIComponent(ruleSetId)}/drafts/${draftId}`,
  draftRule: (ruleSetId: string, draftId: string, ruleId: string) =>
    `/rule-sets/${encodeURIComponent(ruleSetId)}/drafts/${draftId}/rules/${encodeURIComponent(ruleId)}`,
  draftTable: (ruleSetId: string, draftId: string, tableId: string) =>
    `/rule-sets/${encodeURIComponent(ruleSetId)}/drafts/${draftId}/tables/${encodeURIComponent(tableId)}`,
  compareEditions: (ruleSetId: string, edition: string, other?: string) =>
    `/rule-sets/${encodeURIComponent(ruleSetId)}/${encodeURIComponent(edition)}/compare${searchOf(
      other === undefined ? undefined : { with: other },
    )}`,
  quantities: '/quantities',
  quantity: (id: string) => `/quantities#${encodeURIComponent(id)}`,
  people: '/people',
  settings: '/settings',
  laboratories: '/laboratories',
  mappings: '/mappings',
  mapping: (mappingId: string) => `/mappings/${mappingId}`,
  caughtMail: '/caught-mail',
  oneCaughtMail: (mailId: string) => `/caught-mail/${mailId}`,
} as const;

function searchOf(query: Record<string, string | undefined> | undefined): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {})) if (value !== undefined) search.set(name, value);
  const text = search.toString();
  return text === '' ? '' : `?${text}`;
}
