import { Button, Menu, MenuDivider, MenuItem, PopoverNext } from '@blueprintjs/core';
import { CaretDown } from '@blueprintjs/icons';
import type { Preferences } from '@shared/session';
import { useNavigate } from 'react-router-dom';
import { useMe, useSetPreferences, useSignOut } from '../../lib/me.js';
import { setSingleKeys, useSingleKeys } from './single-keys.js';
import { t } from './text.js';

const THEMES: readonly [Preferences['theme'], 'system' | 'light' | 'dark'][] = [
  ['system', 'system'],
  ['light', 'light'],
  ['dark', 'dark'],
];

/** Units, theme and sign-out of the person signed in. */
export function AccountMenu() {
  const me = useMe();
  const set = useSetPreferences();
  const signOut = useSignOut();
  const navigate = useNavigate();
  const singleKeys = useSingleKeys();
  const { preferences } = me;
  const menu = (
    <Menu aria-label={t('account', { name: me.name })}>
      <MenuDivider title={t('units')} />
      <MenuItem roleStructure="listoption" selected={preferences.units === 'si'} text={t('si')} onClick={() => set.mutate({ ...preferences, units: 'si' })} />
      <MenuItem roleStructure="listoption" selected={preferences.units === 'inch-pound'} text={t('inchPound')} onClick={() => set.mutate({ ...preferences, units: 'inch-pound' })} />
      <MenuDivider title={t('theme')} />
      {THEMES.map(([theme, key]) => (
        <MenuItem key={theme} roleStructure="listoption" selected={preferences.theme === theme} text={t(key)} onClick={() => set.mutate({ ...preferences, theme })} />
      ))}
      {!me.roles.includes('customer') && (
        <>
          <MenuDivider title={t('keys')} />
          <MenuItem roleStructure="listoption" selected={singleKeys} text={t('slash')} shouldDismissPopover={false} onClick={() => setSingleKeys(!singleKeys)} />
        </>
      )}
      <MenuDivider />
      {me.shop.mailboxUrl && <MenuItem text={t('mailbox')} href={me.shop.mailboxUrl} target="_blank" rel="noreferrer" />}
      <MenuItem text={t('signOut')} onClick={() => signOut.mutate(undefined, { onSettled: () => void navigate('/sign-in') })} />
    </Menu>
  );
  return (
    <PopoverNext content={menu} placement="bottom-end">
      <Button variant="minimal" endIcon={<CaretDown />} text={me.name} aria-label={t('account', { name: me.name })} />
    </PopoverNext>
  );
}
