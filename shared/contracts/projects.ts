import { z } from 'zod';
import { limits } from '../limits';
import { dateSchema, idSchema, organisationReferenceSchema } from './common';
import { endpoint } from './endpoint';
import { emailSchema, nameSchema } from './session';

export const contactSchema = z.strictObject({
  name: nameSchema,
  /** "resident engineer" */
  function: z.string().trim().max(limits.nameCharacters),
  email: emailSchema,
});

export const editionReferenceSchema = z.strictObject({
  /** The rule set's own id, `cvra-412`. */
  ruleSet: z.string(),
  edition: z.string(),
  title: z.string(),
});

export const sectionSchema = z.strictObject({
  id: idSchema,
  base: editionReferenceSchema,
  layers: z.array(editionReferenceSchema),
  confirmed: z.boolean(),
  confirmedBy: z.string().nullable(),
  resolvedHash: z.string(),
  version: z.number().int(),
  templateHref: z.string(),
});

const projectFields = {
  number: z.string().trim().min(1, 'Enter the contract number.').max(limits.projectNumberCharacters),
  title: z.string().trim().min(1, 'Enter the title.').max(limits.nameCharacters),
  lettingOn: dateSchema.nullable(),
  /** Attributes that the project states, `{ "designTraffic": 12 }`, used where a mix record has none. */
  facts: z.record(z.string(), z.union([z.number(), z.string(), z.boolean()])),
  contacts: z.array(contactSchema),
};

export const projectListItemSchema = z.strictObject({
  id: idSchema,
  number: z.string(),
  title: z.string(),
  lettingOn: dateSchema.nullable(),
  agency: organisationReferenceSchema,
  contractors: z.array(organisationReferenceSchema),
  sections: z.array(
    z.strictObject({
      title: z.string(),
      edition: z.string(),
      layers: z.array(z.string()),
      confirmed: z.boolean(),
    }),
  ),
  submittals: z.number().int(),
});

export const projectSchema = z.strictObject({
  id: idSchema,
  ...projectFields,
  agency: organisationReferenceSchema,
  contractors: z.array(organisationReferenceSchema),
  sections: z.array(sectionSchema),
  /** True where one of the sections stands on a shipped starting point. */
  startingPoint: z.boolean(),
  /** Sections proposed from the letting date that are not in `sections` yet; agency only. */
  proposals: z.array(
    z.strictObject({
      base: editionReferenceSchema,
      layers: z.array(editionReferenceSchema),
      why: z.string(),
    }),
  ),
  /** Published editions and layers that an agency may choose from. */
  choices: z.array(
    z.strictObject({
      base: editionReferenceSchema,
      layers: z.array(editionReferenceSchema),
      state: z.enum(['in force', 'superseded', 'not yet in force']),
    }),
  ),
  version: z.number().int(),
  abilities: z.strictObject({ change: z.boolean(), confirmSections: z.boolean(), upload: z.boolean() }),
});

const projectParams = z.strictObject({ projectId: idSchema });

export const listProjects = endpoint({
  method: 'get',
  path: '/api/projects',
  summary: 'Projects of the active organisation',
  response: z.strictObject({
    projects: z.array(projectListItemSchema),
    abilities: z.strictObject({ add: z.boolean() }),
  }),
});

export const getProject = endpoint({
  method: 'get',
  path: '/api/projects/:projectId',
  summary: 'A project with its sections, contractors and contacts',
  params: projectParams,
  response: projectSchema,
});

export const addProject = endpoint({
  method: 'post',
  path: '/api/projects',
  summary: 'Make a project',
  body: z.strictObject({ ...projectFields, contractorIds: z.array(idSchema) }),
  response: projectSchema,
  status: 201,
  idempotent: true,
});

export const changeProject = endpoint({
  method: 'patch',
  path: '/api/projects/:projectId',
  summary: 'Change a project, its contractors or contacts',
  params: projectParams,
  body: z.strictObject({ ...projectFields, contractorIds: z.array(idSchema) }),
  response: projectSchema,
  versioned: true,
});

export const confirmSection = endpoint({
  method: 'post',
  path: '/api/projects/:projectId/sections',
  summary: 'Confirm a section: one published edition with its ordered layers',
  params: projectParams,
  body: z.strictObject({
    base: z.strictObject({ ruleSet: z.string(), edition: z.string() }),
    layers: z.array(z.strictObject({ ruleSet: z.string(), edition: z.string() })),
  }),
  response: projectSchema,
  status: 201,
  idempotent: true,
});

export const changeSection = endpoint({
  method: 'put',
  path: '/api/projects/:projectId/sections/:sectionId',
  summary: 'Choose another edition or other layers; checks made before become stale',
  params: z.strictObject({ projectId: idSchema, sectionId: idSchema }),
  body: z.strictObject({
    base: z.strictObject({ ruleSet: z.string(), edition: z.string() }),
    layers: z.array(z.strictObject({ ruleSet: z.string(), edition: z.string() })),
  }),
  response: projectSchema,
  versioned: true,
});

export const getSectionTemplate = endpoint({
  method: 'get',
  path: '/api/projects/:projectId/sections/:sectionId/template.xlsx',
  summary: 'The template for a section, filled in with what the project states',
  params: z.strictObject({ projectId: idSchema, sectionId: idSchema }),
  sends: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
});

export type ProjectListItem = z.infer<typeof projectListItemSchema>;
export type Project = z.infer<typeof projectSchema>;
export type Section = z.infer<typeof sectionSchema>;
export type EditionReference = z.infer<typeof editionReferenceSchema>;
