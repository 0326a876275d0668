import { useEffect, useState } from 'react';
import type { ReadingPreview } from '#shared/contracts/corrections';
import { Button } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { usePreview } from '../api/preview-reading';
import { proposalOf, type ReadingAct } from '../lib/reading-act';
import { PreviewLines } from './preview-lines';

const settleMilliseconds = 250;

/** What an act would change, shown before it is kept; then it is kept or left. */
export function Proposal({
  params,
  version,
  act,
  keepLabel,
  keyHint,
  onKeep,
  onLeave,
  isKeeping,
}: {
  params: RevisionParams;
  version: number;
  act: ReadingAct;
  keepLabel: string;
  keyHint?: string;
  onKeep: () => void;
  onLeave: () => void;
  isKeeping: boolean;
}) {
  const settled = useSettled(act);
  const preview = usePreview(params, version, proposalOf(settled));
  const isCurrent = preview.data !== undefined && !preview.isPlaceholderData && settled === act;
  return (
    <div className="proposal">
      <div aria-live="polite" aria-busy={!isCurrent} className={isCurrent ? undefined : 'is-waiting'}>
        <PreviewState error={preview.error} preview={preview.data} />
      </div>
      <div className="acts pt-2">
        <Button onPress={onKeep} isPending={isKeeping} {...(keyHint ? { keyHint } : {})}>
          {keepLabel}
        </Button>
        <Button kind="text" onPress={onLeave}>
          Leave it
        </Button>
      </div>
    </div>
  );
}

function PreviewState({ error, preview }: { error: Error | null; preview: ReadingPreview | undefined }) {
  if (error) {
    return <ProblemNotice problem={asProblem(error)} unaffected="Nothing was kept." />;
  }
  if (!preview) return <p className="small mute">Working out what it would change.</p>;
  return <PreviewLines preview={preview} />;
}

/** A form that is still being filled in asks once its maker pauses, not at every key. */
function useSettled(act: ReadingAct): ReadingAct {
  const [settled, setSettled] = useState(act);
  const key = JSON.stringify(act);
  // biome-ignore lint/correctness/useExhaustiveDependencies: an act is what it says, not which object says it.
  useEffect(() => {
    const timer = setTimeout(() => setSettled(act), settleMilliseconds);
    return () => clearTimeout(timer);
  }, [key]);
  return JSON.stringify(settled) === key ? act : settled;
}
