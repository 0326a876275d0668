import type { Session } from '#shared/contracts/session';
import { paths } from '../../lib/paths';

export interface NavigationItem {
  label: string;
  to: string;
}

/** What the head offers; the server says what the reader may see, roles are never worked out here. */
export function navigationOf(session: Session): NavigationItem[] {
  const { active, abilities } = session;
  if (!active) return [];
  const items: (NavigationItem | false)[] = [
    active.kind === 'contractor' && { label: 'Home', to: paths.home },
    abilities.seeQueue && { label: 'Queue', to: paths.queue },
    { label: 'Submittals', to: paths.submittals },
    { label: 'Projects', to: paths.projects },
    { label: 'Rule sets', to: paths.ruleSets },
    active.kind === 'contractor' && { label: 'Laboratories', to: paths.laboratories },
    active.kind === 'contractor' && { label: 'Mappings', to: paths.mappings },
    abilities.managePeople && { label: 'People', to: paths.people },
    abilities.manageOrganisation && active.kind === 'agency' && { label: 'Settings', to: paths.settings },
    abilities.seeCaughtMail && { label: 'Caught mail', to: paths.caughtMail },
  ];
  return items.filter((item) => item !== false);
}
