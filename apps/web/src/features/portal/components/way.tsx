import { spineDrawing } from '@libs/drawings';
import type { PortalJob } from '@shared/portal';
import { Drawing } from '../../../components/drawing.js';
import { sheetsOf } from '../../../components/spine.js';
import { plainStep } from '../plain-words.js';
import { t } from '../text.js';
import './portal.css';

/** The job's way as a stack of sheets in the owner's words; gates are the shop's own business. */
export function Way({ job }: { readonly job: Pick<PortalJob, 'route' | 'step' | 'state'> }) {
  const sheets = sheetsOf(job).map((sheet) => ({ ...sheet, label: plainStep(sheet.id as PortalJob['step']), gate: 'none' as const }));
  return (
    <div className="lb-portal-way">
      <Drawing drawing={spineDrawing({ sheets, variant: 'full' })} decorative />
      <ol className="visually-hidden">
        {sheets.map((sheet) => (
          <li key={sheet.id} aria-current={sheet.state === 'open' ? 'step' : undefined}>
            {sheet.state === 'open' ? t('wayNow', { step: sheet.label }) : sheet.state === 'done' ? t('wayDone', { step: sheet.label }) : sheet.label}
          </li>
        ))}
      </ol>
    </div>
  );
}
