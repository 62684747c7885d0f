import { Button } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { usersQuery } from '../../../features/shop/api/shop-queries.js';
import { AddPerson } from '../../../features/shop/components/add-person.js';
import { EditPerson } from '../../../features/shop/components/edit-person.js';
import { PeopleTable } from '../../../features/shop/components/people-table.js';
import { ShopTabs } from '../../../features/shop/components/shop-tabs.js';
import { t } from '../../../features/shop/text.js';
import { useMay } from '../../../lib/me.js';

/** Who may sign in, and as what. Whoever is changed stands in the address. */
export function PeoplePage() {
  const users = useQuery(usersQuery);
  const [params, setParams] = useSearchParams();
  const open = params.get('person');
  const show = (person: string | null) => setParams(person === null ? {} : { person });
  const mayManage = useMay('users.manage');
  const edited = users.data?.find((u) => u.id === open);
  return (
    <div>
      <PageHeader title={t('people')} actions={mayManage && <Button intent="primary" text={t('addPerson')} onClick={() => show('new')} />} />
      <ShopTabs />
      <Answer query={users} isEmpty={(all) => all.length === 0} empty={<Empty title={t('noPeople')} />}>
        {(all) => (
          <Panel tight>
            <PeopleTable users={all} onEdit={show} />
          </Panel>
        )}
      </Answer>
      {mayManage && open === 'new' && <AddPerson onClose={() => show(null)} />}
      {edited && <EditPerson key={edited.id} user={edited} onClose={() => show(null)} />}
    </div>
  );
}
