type Listener = (message: string) => void;

const listeners = new Set<Listener>();

/** Says something politely to a screen reader: outcomes that changed, what was kept or sent. */
export function announce(message: string): void {
  for (const listener of listeners) listener(message);
}

export function onAnnouncement(listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
