import { useQuery } from '@tanstack/react-query';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { portalMachinesQuery } from '../../../features/portal/api/portal-queries.js';
import { MachineList } from '../../../features/portal/components/machine-list.js';
import { t } from '../../../features/portal/text.js';

export function PortalMachinesPage() {
  const machines = useQuery(portalMachinesQuery);
  return (
    <div className="stack">
      <PageHeader title={t('machines')} />
      <Answer query={machines} isEmpty={(all) => all.length === 0} empty={<Empty title={t('noMachines')}>{t('noMachinesWords')}</Empty>}>
        {(all) => <MachineList machines={all} />}
      </Answer>
    </div>
  );
}
