import { useEffect, useState } from 'react';
import { z } from 'zod';
import { http, onReach } from '../../lib/http.js';
import { t } from './text.js';

const AGAIN_MS = 5_000;
const alive = z.looseObject({ ok: z.literal(true) });

/** Says that the shop's computer does not answer, and goes when it does; it is asked every few seconds meanwhile. */
export function ConnectionBanner() {
  const [cut, setCut] = useState(false);
  useEffect(() => {
    const lost = () => setCut(true);
    window.addEventListener('offline', lost);
    const stop = onReach((reached) => setCut(!reached));
    return () => {
      window.removeEventListener('offline', lost);
      stop();
    };
  }, []);
  useEffect(() => {
    if (!cut) return;
    const timer = setInterval(() => void http.get('/health/live', alive).catch(() => undefined), AGAIN_MS);
    return () => clearInterval(timer);
  }, [cut]);
  return (
    <div role="status" className="lb-cut-place no-print">
      {cut && <p className="lb-cut">{t('cut')}</p>}
    </div>
  );
}
