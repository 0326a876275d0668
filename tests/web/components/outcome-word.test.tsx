// @vitest-environment happy-dom
import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { outcomeSchema } from '#rules/engine/finding';
import { Mark } from '../../../web/components/ui/mark';
import { Note } from '../../../web/components/ui/note';
import { OutcomeWord } from '../../../web/components/ui/outcome-word';
import '../render-page';

const markIn = (container: HTMLElement) => container.querySelector('svg')?.getAttribute('data-mark');

describe('mark and word', () => {
  it('never part: each outcome has its own mark and is said in words', () => {
    const seen = outcomeSchema.options.map((outcome) => {
      const { container } = render(<OutcomeWord outcome={outcome} />);
      expect(container.textContent?.toLowerCase()).toBe(outcome);
      expect(container.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true');
      return markIn(container);
    });
    expect(new Set(seen).size).toBe(5);
  });

  it('keep the word and colour of a fail that is waived', () => {
    const { container } = render(<OutcomeWord outcome="fail" waived qualifiers={['borderline']} />);
    expect(container.textContent).toBe('Fail waived, borderline');
    expect(markIn(container)).toBe('waived');
    expect(container.querySelector('.outcome')?.classList.contains('outcome-fail')).toBe(true);
  });

  it('is a word for screen readers where the mark stands alone', () => {
    const { container } = render(<Mark name="undecided" alone />);
    expect(container.querySelector('[role="img"]')?.getAttribute('aria-label')).toBe('Undecided');
  });
});

describe('the two pencils', () => {
  it('say in words whether a note is sent or stays', () => {
    const sent = render(
      <Note text="Please correct Pbe." by="I. Tordoff" on="12 Mar" state="to be returned" />,
    );
    expect(sent.container.textContent).toBe('Please correct Pbe.I. Tordoff, 12 Mar, to be returned');
    expect(sent.container.querySelector('sub')?.textContent).toBe('be');
    const kept = render(<Note text="Ask Dele." by="M. Halloran" on="12 Mar" state="internal" />);
    expect(kept.container.textContent).toContain('internal');
    expect(kept.container.querySelector('.note-internal')).not.toBeNull();
    expect(sent.container.querySelector('.note-internal')).toBeNull();
  });
});
