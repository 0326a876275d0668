import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { Revision } from '#shared/contracts/submittals';
import { formatDate } from '#shared/format/dates';
import { PageHead } from '../../../components/ui/page-head';
import { paths } from '../../../lib/paths';

/** Project over it, mix and revision as the title, what the mix is under it. */
export function RevisionHead({ revision, children }: { revision: Revision; children?: ReactNode }) {
  const { project, laboratory, contractor } = revision;
  return (
    <PageHead
      kickerOnPhones={false}
      kicker={
        <>
          <Link className="plain" to={paths.project(project.id)}>
            {project.number} {project.title}
          </Link>
          {project.lettingOn ? ` · letting ${formatDate(project.lettingOn)}` : ''}
        </>
      }
      title={revision.mixDesignation}
      rest={`revision ${revision.number}, ${contractor.name}`}
      lede={[revision.description, `tested at ${laboratory.name}`].filter((part) => part !== '').join(' · ')}
    >
      {children}
    </PageHead>
  );
}
