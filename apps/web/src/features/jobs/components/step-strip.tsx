import type { FloorSteps } from '@shared/jobs';
import type { Step } from '@shared/route';
import { Link, useSearchParams } from 'react-router-dom';
import { stepName } from '../../../lib/step-names.js';
import { t } from '../floor-text.js';
import { Bars, Flag } from './job-marks.js';
import './step-strip.css';

/** How many jobs stand at each step; each cell filters the list, and lets it go again. */
export function StepStrip({ steps, chosen }: { readonly steps: FloorSteps; readonly chosen: Step | undefined }) {
  const [params] = useSearchParams();
  const hrefOf = (step: Step) => {
    const next = new URLSearchParams(params);
    next.delete('page');
    if (step === chosen) next.delete('step');
    else next.set('step', step);
    return `?${next}`;
  };
  return (
    <nav className="lb-steps" aria-label={t('steps')}>
      {steps.map(({ step, open, onHold, late }) => (
        <Link key={step} to={hrefOf(step)} aria-current={step === chosen ? 'true' : undefined} className={open + onHold === 0 ? 'none' : ''}>
          <span className="count num">{open + onHold}</span>
          <span className="name">{stepName(step)}</span>
          <span className="visually-hidden">{t('stepCell', { open, held: onHold, late })}</span>
          <span className="marks" aria-hidden="true">
            {late > 0 && (
              <span className="late num">
                <Flag />
                {late}
              </span>
            )}
            {onHold > 0 && (
              <span className="held num">
                <Bars />
                {onHold}
              </span>
            )}
          </span>
        </Link>
      ))}
    </nav>
  );
}
