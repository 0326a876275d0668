import { useEffect, useRef, useState } from 'react';
import type { DraftDocument } from '#rules/authoring/document-parts';
import type { LintRemark } from '#rules/authoring/lint/remark';
import type { Layer, RuleSet } from '#rules/rule-sets/schema';
import type { RemarksAsked } from '../lib/remarks-worker';

/** How long the draft rests before it is looked at. */
const restMs = 600;

interface Answer {
  number: number;
  remarks: LintRemark[];
}

/** What an author should look at, renewed when typing pauses; the last answer stays in sight meanwhile. */
export function useRemarks(document: DraftDocument, base: RuleSet | Layer | null): LintRemark[] | null {
  const [remarks, setRemarks] = useState<LintRemark[] | null>(null);
  const worker = useRef<Worker | null>(null);
  const asked = useRef(0);
  useEffect(() => {
    const own = new Worker(new URL('../lib/remarks-worker.ts', import.meta.url), { type: 'module' });
    own.addEventListener('message', ({ data }: MessageEvent<Answer>) => {
      if (data.number === asked.current) setRemarks(data.remarks);
    });
    worker.current = own;
    return () => own.terminate();
  }, []);
  useEffect(() => {
    const timer = setTimeout(() => {
      asked.current += 1;
      worker.current?.postMessage({ number: asked.current, document, base } satisfies RemarksAsked);
    }, restMs);
    return () => clearTimeout(timer);
  }, [document, base]);
  return remarks;
}
