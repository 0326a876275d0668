import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { Project, Section } from '#shared/contracts/projects';
import { Button } from '../../../components/ui/button';
import { paths } from '../../../lib/paths';
import { useChangeSection } from '../api/change-section';
import { editionKey } from '../lib/edition-key';
import { SectionForm } from './section-form';

export function SectionList({ project }: { project: Project }) {
  return (
    <ul>
      {project.sections.map((section) => (
        <SectionItem key={section.id} project={project} section={section} />
      ))}
    </ul>
  );
}

function SectionItem({ project, section }: { project: Project; section: Section }) {
  const [isChanging, setIsChanging] = useState(false);
  const change = useChangeSection(project.id);
  const { base, layers } = section;
  return (
    <li className="project-section">
      <p>
        <b>
          <Link
            className="plain inline-block py-1"
            to={paths.ruleSet(base.ruleSet, base.edition, layers.map(editionKey))}
          >
            {base.title}, edition {base.edition}
          </Link>
        </b>
        {section.confirmed ? null : <span className="mute"> to be confirmed</span>}
      </p>
      {layers.length > 0 ? (
        <ol className="layer-list">
          {layers.map((layer) => (
            <li key={editionKey(layer)}>
              with{' '}
              <Link className="plain inline-block py-1" to={paths.ruleSet(layer.ruleSet, layer.edition)}>
                {layer.title}, edition {layer.edition}
              </Link>
            </li>
          ))}
        </ol>
      ) : null}
      <p className="acts small">
        <a href={section.templateHref} download>
          Template of this section
        </a>
        <span className="mute">
          {section.confirmedBy ? `confirmed by ${section.confirmedBy}` : null} · rules{' '}
          {section.resolvedHash.slice(0, 8)}
        </span>
        {project.abilities.confirmSections && !isChanging ? (
          <Button kind="text" onPress={() => setIsChanging(true)}>
            Choose another edition or layers
          </Button>
        ) : null}
      </p>
      {isChanging ? (
        <SectionForm
          project={project}
          start={section}
          act="Change the section"
          caution="Checks made before become stale and say so; they are kept."
          onChoose={async (choice) => {
            await change(section, choice);
            setIsChanging(false);
          }}
          onLeave={() => setIsChanging(false)}
        />
      ) : null}
    </li>
  );
}
