import { spineDrawing } from '@libs/drawings';
import type { JobSheet } from '@shared/jobs';
import { Link } from 'react-router-dom';
import { Drawing } from '../../../components/drawing.js';
import { sheetsOf } from '../../../components/spine.js';
import { t } from '../text.js';

/** The job's spine without its words, along the edge of the bench: where this test stands, and the way back. */
export function SpineRail({ job }: { readonly job: JobSheet }) {
  const sheets = sheetsOf(job, (step) => job.gates.some((g) => g.before === step && g.open));
  const { shapes, ...drawing } = spineDrawing({ sheets, variant: 'full' });
  return (
    <Link className="lb-bench-rail" to={`/jobs/${job.id}`} aria-label={t('toJob', { number: job.number })} title={t('route', { number: job.number })}>
      <Drawing drawing={{ ...drawing, width: 78, shapes: shapes.filter((s) => s.kind !== 'text') }} decorative />
    </Link>
  );
}
