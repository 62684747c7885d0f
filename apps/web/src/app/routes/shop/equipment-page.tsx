import { useQuery } from '@tanstack/react-query';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { equipmentQuery } from '../../../features/equipment/api/equipment-queries.js';
import { DueList } from '../../../features/equipment/components/due-list.js';
import { EquipmentEditor } from '../../../features/equipment/components/equipment-editor.js';
import { EquipmentHistory } from '../../../features/equipment/components/equipment-history.js';
import { t } from '../../../features/equipment/text.js';
import { ShopTabs } from '../../../features/shop/components/shop-tabs.js';

/** What the bay has: supplies, cables and ovens, and what must go to calibration. */
export function EquipmentPage() {
  const equipment = useQuery(equipmentQuery);
  return (
    <div>
      <PageHeader title={t('title')} below={t('help')} />
      <ShopTabs />
      <div className="stack">
        <DueList />
        <Answer query={equipment}>
          {(data) => (
            <>
              <EquipmentEditor equipment={data} />
              <EquipmentHistory changes={data.changes} removed={data.removed} />
            </>
          )}
        </Answer>
      </div>
    </div>
  );
}
