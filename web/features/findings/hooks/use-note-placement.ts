import { type RefObject, useLayoutEffect } from 'react';
import { placeNotes } from '../lib/place-notes';

const marginWidth = '(min-width: 900px)';

/** Keeps the margin's notes level with their rows and off each other while rows open, fold and are written on. */
export function useNotePlacement(ledger: RefObject<HTMLElement | null>): void {
  useLayoutEffect(() => {
    const frame = ledger.current;
    if (!frame) return;
    const place = () => placeIn(frame);
    const sizes = new ResizeObserver(place);
    const watch = () => {
      sizes.disconnect();
      sizes.observe(frame);
      for (const note of frame.querySelectorAll('.margin-note')) sizes.observe(note);
      place();
    };
    const rows = new MutationObserver(watch);
    rows.observe(frame, { childList: true, subtree: true });
    watch();
    return () => {
      sizes.disconnect();
      rows.disconnect();
    };
  }, [ledger]);
}

function placeIn(frame: HTMLElement): void {
  const notes = [...frame.querySelectorAll<HTMLElement>('.margin-note')];
  if (!window.matchMedia(marginWidth).matches) {
    frame.style.removeProperty('--notes-reach');
    for (const note of notes) note.style.removeProperty('top');
    return;
  }
  const frameTop = frame.getBoundingClientRect().top;
  const boxes = notes.map((note) => ({
    rowTop: (note.parentElement ?? note).getBoundingClientRect().top - frameTop,
    height: note.offsetHeight,
  }));
  const placed = placeNotes(boxes);
  let bottom = 0;
  placed.forEach(({ offset, leader }, index) => {
    const note = notes[index];
    const box = boxes[index];
    if (!note || !box) return;
    note.style.top = `${offset}px`;
    note.classList.toggle('has-leader', leader);
    bottom = Math.max(bottom, box.rowTop + offset + box.height);
  });
  // A long last note runs past its row; the page has to reach as far as it does.
  frame.style.setProperty('--notes-reach', `${Math.ceil(bottom)}px`);
}
