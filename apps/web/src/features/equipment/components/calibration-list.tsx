import { Button } from '@blueprintjs/core';
import { Upload } from '@blueprintjs/icons';
import type { CalibrationView } from '@shared/calibrations';
import { useRef, useState, type ChangeEvent } from 'react';
import { ErrorNotice } from '../../../components/notices.js';
import { StateMark } from '../../../components/state-mark.js';
import { calendarDay, momentOf, sizeOf } from '../../../lib/format.js';
import { newKey } from '../../../lib/http.js';
import { useAddCertificate } from '../api/instrument-queries.js';
import { t } from '../instrument-text.js';
import './equipment.css';

const MOST_BYTES = 15 * 1024 * 1024;
const TONES = { within: 'good', outside: 'bad', 'not-stated': 'quiet' } as const;

interface CalibrationListProps {
  readonly instrumentId: string;
  readonly calibrations: readonly CalibrationView[];
  readonly mayEdit: boolean;
}

/** Every calibration, the newest first, with what it found and its certificate. */
export function CalibrationList({ instrumentId, calibrations, mayEdit }: CalibrationListProps) {
  if (calibrations.length === 0) return <p className="muted">{t('noCalibrations')}</p>;
  return (
    <div>
      {calibrations.map((c) => (
        <article key={c.id} className={`lb-calibration stack${c.superseded ? ' superseded' : ''}`}>
          <div className="row spread">
            <h3>
              {t('calibrationOf', { day: calendarDay(c.calibratedOn) })} <span className="muted">{t('dueAgain', { day: calendarDay(c.dueOn) })}</span>
            </h3>
            {c.superseded ? <StateMark tone="quiet" words={t('superseded')} /> : <StateMark tone={TONES[c.asFound]} words={t(c.asFound)} />}
          </div>
          {c.asFoundWords && <p>{c.asFoundWords}</p>}
          <p className="muted">
            {[c.certificateNumber, c.laboratory, t('errorWords', { reading: c.percentOfReading, range: c.percentOfRange })].filter(Boolean).join(' · ')}
            <br />
            {c.by === '' ? t('fromRegister') : t('enteredBy', { who: c.by, when: momentOf(c.at) })}
          </p>
          <CertificateLine instrumentId={instrumentId} calibration={c} mayAdd={mayEdit && !c.superseded} />
        </article>
      ))}
    </div>
  );
}

function CertificateLine({ instrumentId, calibration, mayAdd }: { readonly instrumentId: string; readonly calibration: CalibrationView; readonly mayAdd: boolean }) {
  const add = useAddCertificate(instrumentId);
  const picker = useRef<HTMLInputElement>(null);
  const [refused, setRefused] = useState<string | null>(null);
  const [name, setName] = useState('');
  const { certificate, calibratedOn } = calibration;
  const onPick = (event: ChangeEvent<HTMLInputElement>) => {
    const file = event.target.files?.[0];
    // the same file may be chosen again after it failed
    event.target.value = '';
    if (!file) return;
    // the server looks at the bytes; what the browser says only saves a useless trip
    const words = file.type !== '' && file.type !== 'application/pdf' ? t('onlyPdf') : file.size > MOST_BYTES ? t('tooLarge', { size: sizeOf(file.size) }) : null;
    setRefused(words);
    setName(file.name);
    add.reset();
    if (words === null) add.mutate({ calibrationId: calibration.id, file, key: newKey() });
  };
  return (
    <>
      <div className="row">
        {certificate ? <a href={`/api/instruments/${instrumentId}/certificates/${certificate.id}`}>{t('fileWords', { name: certificate.name, size: sizeOf(certificate.sizeBytes) })}</a> : <span className="muted">{t('noFile')}</span>}
        {mayAdd && (
          <>
            <Button
              size="small"
              icon={<Upload />}
              text={certificate ? t('replace') : t('upload')}
              aria-label={(certificate ? t('replaceOf', { day: calendarDay(calibratedOn) }) : t('uploadOf', { day: calendarDay(calibratedOn) }))}
              loading={add.isPending}
              onClick={() => picker.current?.click()}
            />
            <input ref={picker} type="file" accept="application/pdf" hidden aria-label={t('uploadOf', { day: calendarDay(calibratedOn) })} onChange={onPick} />
          </>
        )}
        {add.isPending && <span role="status">{t('uploading', { name })}</span>}
      </div>
      {refused && (
        <p className="lb-problem" role="alert">
          {refused}
        </p>
      )}
      <ErrorNotice error={add.error} />
    </>
  );
}
