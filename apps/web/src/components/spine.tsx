import { spineDrawing, spinePlaces, type SpineSheet } from '@libs/drawings';
import { ROUTE_STEPS, GATE_BEFORE, stepIndex, type JobState, type Route, type Step } from '@shared/route';
import { Link } from 'react-router-dom';
import { stepName } from '../lib/step-names.js';
import { defineText } from '../lib/text.js';
import { Drawing } from './drawing.js';
import './spine.css';

const t = defineText({ done: 'done', open: 'open now', 'to-come': 'to come', skipped: 'left out', gateShut: ', gate shut' });

export interface SpineJob {
  readonly route: Route;
  readonly step: Step;
  readonly state: JobState;
}

/** The sheets of a job: what is done, open, to come, and how its gates stand. */
export function sheetsOf(job: SpineJob, gateIsOpen: (step: Step) => boolean = () => false): SpineSheet[] {
  const at = stepIndex(job.route, job.step);
  const ended = job.state !== 'open' && job.state !== 'on-hold';
  return ROUTE_STEPS[job.route].map((step, i) => ({
    id: step,
    label: stepName(step),
    state: i < at || (ended && job.state === 'released' && i === at) ? 'done' : i === at && !ended ? 'open' : i === at ? 'done' : 'to-come',
    gate: GATE_BEFORE[step] === undefined ? 'none' : i <= at || gateIsOpen(step) ? 'open' : 'shut',
  }));
}

interface SpineProps {
  readonly sheets: readonly SpineSheet[];
  /** where a sheet leads; the current one is marked */
  readonly hrefOf: (id: string) => string;
  readonly current: string;
  readonly label: string;
}

/** The route as a stack of sheets, each a link to its work. */
export function Spine({ sheets, hrefOf, current, label }: SpineProps) {
  const drawing = spineDrawing({ sheets, variant: 'full' });
  const scale = 100 / drawing.height;
  return (
    <nav className="lb-spine" aria-label={label} style={{ aspectRatio: `${drawing.width} / ${drawing.height}` }}>
      <Drawing drawing={drawing} decorative />
      <ol>
        {spinePlaces(sheets).map((place, i) => {
          const sheet = sheets[i]!;
          return (
            <li key={place.id} style={{ top: `${(place.y - 3) * scale}%`, height: `${(place.height + 6) * scale}%` }}>
              <Link to={hrefOf(place.id)} aria-current={place.id === current ? 'step' : undefined}>
                <span className="visually-hidden">
                  {sheet.label}, {t(sheet.state)}
                  {sheet.gate === 'shut' ? t('gateShut') : ''}
                </span>
              </Link>
            </li>
          );
        })}
      </ol>
    </nav>
  );
}

/** The same spine, small, for a row of a table. */
export function MiniSpine({ job }: { readonly job: SpineJob }) {
  const drawing = spineDrawing({ sheets: sheetsOf(job), variant: 'mini' });
  return (
    <span className="lb-mini-spine">
      <Drawing drawing={drawing} width={drawing.width} />
    </span>
  );
}
