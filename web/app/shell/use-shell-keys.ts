import { focusSearch } from '../../features/search/focus-search';
import { useShortcuts } from '../../lib/shortcuts';
import { openKeyList } from './key-list-state';

export function useShellKeys(): void {
  useShortcuts([
    { key: '/', label: 'find', run: focusSearch },
    { key: '?', label: 'all keys', run: openKeyList },
  ]);
}
