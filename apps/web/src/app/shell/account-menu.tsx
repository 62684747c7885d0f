import { Button, PopoverNext, PopupKind, Radio, RadioGroup, Switch } from '@blueprintjs/core';
import { CaretDown } from '@blueprintjs/icons';
import type { Preferences } from '@shared/session';
import { useNavigate } from 'react-router-dom';
import { useMe, useSetPreferences, useSignOut } from '../../lib/me.js';
import { setSingleKeys, useSingleKeys } from './single-keys.js';
import { t } from './text.js';

/** Units, theme and sign-out of the person signed in. */
export function AccountMenu() {
  const me = useMe();
  const set = useSetPreferences();
  const signOut = useSignOut();
  const navigate = useNavigate();
  const singleKeys = useSingleKeys();
  const { preferences } = me;
  const change = (part: Partial<Preferences>) => set.mutate({ ...preferences, ...part });
  const panel = (
    <div className="lb-account">
      <p className="muted">{me.email}</p>
      <RadioGroup label={t('units')} inline selectedValue={preferences.units} onChange={(e) => change({ units: e.currentTarget.value as Preferences['units'] })}>
        <Radio value="si" label={t('si')} />
        <Radio value="inch-pound" label={t('inchPound')} />
      </RadioGroup>
      <RadioGroup label={t('theme')} inline selectedValue={preferences.theme} onChange={(e) => change({ theme: e.currentTarget.value as Preferences['theme'] })}>
        <Radio value="system" label={t('system')} />
        <Radio value="light" label={t('light')} />
        <Radio value="dark" label={t('dark')} />
      </RadioGroup>
      {!me.roles.includes('customer') && <Switch checked={singleKeys} label={t('slash')} onChange={(e) => setSingleKeys(e.currentTarget.checked)} />}
      {set.error && (
        <p className="lb-problem" role="alert">
          {set.error.message}
        </p>
      )}
      <div className="row spread">
        {me.shop.mailboxUrl ? (
          <a href={me.shop.mailboxUrl} target="_blank" rel="noreferrer">
            {t('mailbox')}
          </a>
        ) : (
          <span />
        )}
        <Button text={t('signOut')} loading={signOut.isPending} onClick={() => signOut.mutate(undefined, { onSettled: () => void navigate('/sign-in') })} />
      </div>
    </div>
  );
  return (
    <PopoverNext content={panel} placement="bottom-end" popupKind={PopupKind.DIALOG}>
      <Button variant="minimal" endIcon={<CaretDown />} text={me.name} aria-label={t('account', { name: me.name })} />
    </PopoverNext>
  );
}
