import { Button } from '@blueprintjs/core';
import type { InstrumentView } from '@shared/instruments';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { instrumentsQuery } from '../../../features/instruments/api/instrument-queries.js';
import { InstrumentDialog } from '../../../features/instruments/components/instrument-dialog.js';
import { InstrumentList } from '../../../features/instruments/components/instrument-list.js';
import { t } from '../../../features/instruments/text.js';
import { useMay } from '../../../lib/me.js';

/** The register of instruments with their standing. */
export function InstrumentsPage() {
  const instruments = useQuery(instrumentsQuery);
  const mayEdit = useMay('instruments.edit');
  const [open, setOpen] = useState<InstrumentView | 'new' | null>(null);
  const add = mayEdit && <Button intent="primary" text={t('add')} onClick={() => setOpen('new')} />;
  return (
    <>
      <PageHeader
        title={t('title')}
        below={
          <>
            {t('below')} <Link to="/bay">{t('toBay')}</Link>
          </>
        }
        actions={add}
      />
      <Answer
        query={instruments}
        isEmpty={(all) => all.length === 0}
        empty={
          <Empty title={t('none')}>
            <p>{t('noneWords')}</p>
            {add}
          </Empty>
        }
      >
        {(all) => (
          <Panel>
            <InstrumentList instruments={all} onEdit={mayEdit ? setOpen : null} />
          </Panel>
        )}
      </Answer>
      {open && <InstrumentDialog instrument={open === 'new' ? null : open} onClose={() => setOpen(null)} />}
    </>
  );
}
