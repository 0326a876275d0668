/** Where the template of a project's section is downloaded. */
export function templateHrefOf({ projectId, sectionId }: { projectId: string; sectionId: string }): string {
  return `/api/projects/${projectId}/sections/${sectionId}/template.xlsx`;
}
