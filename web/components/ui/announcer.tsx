import { useEffect, useState } from 'react';
import { onAnnouncement } from '../../lib/announce';

/** The one polite live region of the product. */
export function Announcer() {
  const [message, setMessage] = useState('');
  useEffect(() => onAnnouncement(setMessage), []);
  return (
    <div className="hidden-text" role="status" aria-live="polite">
      {message}
    </div>
  );
}
