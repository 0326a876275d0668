import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { Header, MenuSection } from 'react-aria-components';
import { signOut } from '#shared/contracts/session';
import { MenuItem } from '../../components/ui/menu';
import { call } from '../../lib/api';
import { paths } from '../../lib/paths';
import { useSingleKeys } from '../../lib/shortcuts';
import { chooseTheme, chosenTheme, type Theme } from '../../lib/theme';
import { openKeyList } from './key-list-state';

const themes: { value: Theme; label: string }[] = [
  { value: 'system', label: 'As the system' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
];

export function PersonMenuItems() {
  const [theme, setTheme] = useState(chosenTheme);
  const [singleKeys, setSingleKeys] = useSingleKeys();
  const leave = useMutation({
    mutationFn: () => call(signOut, {}),
    // A fresh document: nothing of the session stays in memory.
    onSuccess: () => window.location.assign(paths.signIn),
  });
  return (
    <>
      <MenuSection
        selectionMode="single"
        selectedKeys={[theme]}
        onSelectionChange={(keys) => {
          const chosen = themes.find((each) => keys !== 'all' && keys.has(each.value));
          if (!chosen) return;
          chooseTheme(chosen.value);
          setTheme(chosen.value);
        }}
      >
        <Header className="menu-head">Theme</Header>
        {themes.map(({ value, label }) => (
          <MenuItem key={value} id={value} textValue={label}>
            {label}
            <small>{theme === value ? 'chosen' : ''}</small>
          </MenuItem>
        ))}
      </MenuSection>
      <MenuSection aria-label="Keys">
        <MenuItem id="single-keys" textValue="Single keys" onAction={() => setSingleKeys(!singleKeys)}>
          Single keys
          <small>{singleKeys ? 'on' : 'off'}</small>
        </MenuItem>
        <MenuItem id="keys" textValue="All keys" onAction={openKeyList}>
          All keys of this page
          <small>?</small>
        </MenuItem>
      </MenuSection>
      <MenuSection aria-label="Session">
        <MenuItem id="sign-out" textValue="Sign out" onAction={() => leave.mutate()}>
          Sign out
        </MenuItem>
      </MenuSection>
    </>
  );
}
