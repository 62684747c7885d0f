import { Button } from '@blueprintjs/core';
import { useEffect, useState } from 'react';
import { useFormContext } from 'react-hook-form';
import { useUnits } from '../../../components/units.js';
import { typedFrom } from '../../../lib/typed.js';
import type { BenchValues } from '../bench-form.js';
import { t } from '../text.js';

const clockText = (ms: number) => `${Math.floor(ms / 60_000)}:${String(Math.floor(ms / 1000) % 60).padStart(2, '0')}`;

/** Counts the minutes at full flux; it goes on through a reload, and stopping it fills them in. */
export function FluxTimer({ storageKey }: { readonly storageKey: string }) {
  const key = `loopbay.timer.${storageKey}`;
  const { setValue } = useFormContext<BenchValues>();
  const system = useUnits();
  const [since, setSince] = useState<number | null>(() => Number(localStorage.getItem(key)) || null);
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    if (since === null) return;
    const tick = setInterval(() => setNow(Date.now()), 1000);
    return () => clearInterval(tick);
  }, [since]);
  const start = () => {
    const at = Date.now();
    localStorage.setItem(key, String(at));
    setSince(at);
    setNow(at);
  };
  const stop = () => {
    const minutes = Math.floor((Date.now() - (since ?? Date.now())) / 60_000);
    localStorage.removeItem(key);
    setSince(null);
    setValue('temperatures.minutes', typedFrom(minutes, 'duration', system), { shouldDirty: true, shouldTouch: true });
  };
  return since === null ? (
    <Button className="lb-bench-big" text={t('timerStart')} onClick={start} />
  ) : (
    <Button className="lb-bench-big num" intent="primary" text={t('timerStop', { time: clockText(Math.max(0, now - since)) })} onClick={stop} />
  );
}
