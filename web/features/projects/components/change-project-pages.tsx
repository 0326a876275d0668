import { Link, useNavigate } from 'react-router-dom';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { paths } from '../../../lib/paths';
import { useProject } from '../../../lib/queries/projects-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useAddProject, useChangeProject } from '../api/change-project';
import { ProjectForm } from './project-form';
import '../projects.css';

export function NewProjectPage() {
  usePageTitle('Add a project');
  const add = useAddProject();
  const navigate = useNavigate();
  return (
    <PlainPage>
      <PageHead
        kicker={<Link to={paths.projects}>Projects</Link>}
        title="Add a project"
        lede="Sections are proposed from the letting date and confirmed on the project’s own page."
      />
      <ProjectForm
        project={null}
        act="Make the project"
        submit={async (fields) => {
          const { id } = await add(fields);
          await navigate(paths.project(id));
        }}
      />
    </PlainPage>
  );
}

export function ChangeProjectPage({ projectId }: { projectId: string }) {
  const project = useProject(projectId);
  usePageTitle(`Change ${project.number}`);
  const change = useChangeProject();
  const navigate = useNavigate();
  return (
    <PlainPage>
      <PageHead
        kicker={<Link to={paths.project(projectId)}>{project.number}</Link>}
        title="Change the project"
        rest={project.title}
      />
      <ProjectForm
        key={project.version}
        project={project}
        act="Keep the changes"
        submit={async (fields) => {
          await change(project, fields);
          await navigate(paths.project(projectId));
        }}
      />
    </PlainPage>
  );
}
