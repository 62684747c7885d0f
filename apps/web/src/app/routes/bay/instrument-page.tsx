import { Button } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { instrumentQuery } from '../../../features/equipment/api/instrument-queries.js';
import { CalibrationDialog } from '../../../features/equipment/components/calibration-dialog.js';
import { CalibrationList } from '../../../features/equipment/components/calibration-list.js';
import { DoubtNotice } from '../../../features/equipment/components/doubt-notice.js';
import { InstrumentFacts } from '../../../features/equipment/components/instrument-facts.js';
import { MeasuredList } from '../../../features/equipment/components/measured-list.js';
import { t } from '../../../features/equipment/instrument-text.js';
import { instrumentKindName } from '../../../lib/instrument-kinds.js';
import { useMay } from '../../../lib/me.js';

/** One instrument: how it stands, its calibrations, and what was measured with it. */
export function InstrumentPage() {
  const { id = '' } = useParams();
  const query = useQuery(instrumentQuery(id));
  const mayEdit = useMay('instruments.edit');
  const [entering, setEntering] = useState(false);
  return (
    <Answer query={query}>
      {({ instrument, calibrations }) => (
        <div className="stack" key={instrument.id}>
          <PageHeader
            title={`${instrument.tag}, ${instrumentKindName(instrument.kind)}`}
            below={<Link to="/bay/instruments">{t('register')}</Link>}
            actions={mayEdit && <Button intent="primary" text={t('record')} onClick={() => setEntering(true)} />}
          />
          <DoubtNotice calibrations={calibrations} />
          <div className="two-columns">
            <Panel title={t('calibrations')}>
              <CalibrationList instrumentId={instrument.id} calibrations={calibrations} mayEdit={mayEdit} />
            </Panel>
            <InstrumentFacts instrument={instrument} />
          </div>
          <MeasuredList instrumentId={instrument.id} />
          {entering && <CalibrationDialog instrument={instrument} onReadAgain={() => void query.refetch()} onClose={() => setEntering(false)} />}
        </div>
      )}
    </Answer>
  );
}
