import { useState } from 'react';
import type { Project } from '#shared/contracts/projects';
import { sectionWords } from '#shared/format/section-words';
import { Button } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { SectionHead } from '../../../components/ui/section-head';
import { asProblem } from '../../../lib/problem';
import { useConfirmSection } from '../api/change-section';
import { editionKey } from '../lib/edition-key';
import { SectionForm } from './section-form';

/** What the letting date points to; it counts only once a person has confirmed it. */
export function SectionProposals({ project }: { project: Project }) {
  const confirm = useConfirmSection(project.id);
  const [isChoosing, setIsChoosing] = useState(false);
  const [sending, setSending] = useState<string | null>(null);
  const [error, setError] = useState<unknown>(null);
  const take = async (proposal: Project['proposals'][number]) => {
    setSending(editionKey(proposal.base));
    setError(null);
    try {
      await confirm({
        base: { ruleSet: proposal.base.ruleSet, edition: proposal.base.edition },
        layers: proposal.layers.map(({ ruleSet, edition }) => ({ ruleSet, edition })),
      });
    } catch (thrown) {
      setError(thrown);
    } finally {
      setSending(null);
    }
  };
  return (
    <>
      {project.proposals.length > 0 ? (
        <SectionHead title="Proposed" about="from the letting date; confirm what holds" />
      ) : null}
      {error ? (
        <ProblemNotice problem={asProblem(error)} unaffected="The sections are as they were." />
      ) : null}
      <ul>
        {project.proposals.map((proposal) => (
          <li key={editionKey(proposal.base)} className="project-section">
            <p>
              <b>{sectionWords(proposal)}</b>
            </p>
            <p className="small mute">{proposal.why}</p>
            <div className="acts pt-1">
              <Button
                onPress={() => void take(proposal)}
                isPending={sending === editionKey(proposal.base)}
                aria-label={`Confirm ${sectionWords(proposal)}`}
              >
                Confirm this section
              </Button>
            </div>
          </li>
        ))}
      </ul>
      {isChoosing ? (
        <SectionForm
          project={project}
          start={null}
          act="Confirm this section"
          caution="Workbooks of this project can then be checked under it."
          onChoose={async (choice) => {
            await confirm(choice);
            setIsChoosing(false);
          }}
          onLeave={() => setIsChoosing(false)}
        />
      ) : project.choices.length > 0 ? (
        <Button kind="text" onPress={() => setIsChoosing(true)}>
          Choose another section
        </Button>
      ) : null}
    </>
  );
}
