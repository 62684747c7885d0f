import { Button } from '@blueprintjs/core';
import type { UserView } from '@shared/session';
import { DataTable, type Column } from '../../../components/data-table.js';
import { StateMark } from '../../../components/state-mark.js';
import { t } from '../text.js';
import { rolesWords } from '../user-form.js';

export function PeopleTable({ users, onEdit }: { readonly users: readonly UserView[]; readonly onEdit: (id: string) => void }) {
  const columns: readonly Column<UserView>[] = [
    { key: 'name', title: t('name'), cell: (u) => <b>{u.name}</b> },
    { key: 'email', title: t('email'), cell: (u) => u.email },
    { key: 'roles', title: t('roles'), cell: (u) => rolesWords(u.roles) },
    { key: 'customer', title: t('customer'), cell: (u) => u.customerName ?? <span className="muted">–</span> },
    { key: 'state', title: t('standsAs'), cell: (u) => (u.disabled ? <StateMark tone="quiet" words={t('mayNot')} /> : <StateMark tone="good" words={t('maySignIn')} />) },
    { key: 'edit', title: t('change'), cell: (u) => <Button text={t('change')} aria-label={t('edit', { name: u.name })} onClick={() => onEdit(u.id)} /> },
  ];
  return <DataTable caption={t('people')} columns={columns} rows={users} rowKey={(u) => u.id} />;
}
