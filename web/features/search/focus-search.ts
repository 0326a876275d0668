export const searchFieldId = 'find';

const afterMenuMilliseconds = 60;

/** From a menu, which gives the focus back to its button as it closes. */
export function focusSearchAfterMenu(): void {
  setTimeout(focusSearch, afterMenuMilliseconds);
}

/** Brings the search field out where the head hides it, and puts the cursor in it. */
export function focusSearch(): void {
  document.querySelector('.running-head')?.classList.add('is-finding');
  const field = document.getElementById(searchFieldId);
  if (field instanceof HTMLInputElement) {
    field.focus();
    field.select();
  }
}
