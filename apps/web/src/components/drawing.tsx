import type { Drawing as DrawingModel, Ink, Paint, Shape } from '@libs/drawings';
import { Fragment, useId, type ReactNode, type SVGProps } from 'react';
import './drawing.css';

const ink = (paint: Paint): string => (typeof paint === 'string' ? `var(--lb-${paint})` : `color-mix(in srgb, var(--lb-${paint.from}) ${Math.round((1 - paint.share) * 100)}%, var(--lb-${paint.to}))`);

interface DrawingProps {
  readonly drawing: DrawingModel;
  /** in CSS; the drawing keeps its proportions */
  readonly width?: string | number;
  readonly onMark?: (mark: string) => void;
  /** the mark that is looked at: its shapes get an outline */
  readonly shownMark?: string | undefined;
  readonly svgProps?: Pick<SVGProps<SVGSVGElement>, 'onPointerMove' | 'onPointerLeave'>;
  /** figures behind the picture, offered below it */
  readonly withTable?: string;
  readonly decorative?: boolean;
}

/** Paints a drawing of `@libs/drawings` in the colours of the theme. */
export function Drawing({ drawing, width = '100%', onMark, shownMark, svgProps, withTable, decorative = false }: DrawingProps) {
  const id = useId();
  // a pattern takes its colour from where it is defined, not from where it is used: one for each ink
  const hatchOf = (of: Ink) => `hatch-${of}-${id}`;
  const hatched = [...new Set(drawing.shapes.flatMap((s) => (s.kind === 'hatch' ? [s.ink] : [])))];
  const picture = (
    <svg
      className="lb-drawing"
      viewBox={`0 0 ${drawing.width} ${drawing.height}`}
      width={width}
      {...(decorative ? { 'aria-hidden': true } : { role: 'img', 'aria-labelledby': `${id}-t ${id}-d` })}
      onClick={(event) => {
        const mark = (event.target as Element).getAttribute('data-mark');
        if (mark && onMark) onMark(mark);
      }}
      {...svgProps}
    >
      {!decorative && (
        <>
          <title id={`${id}-t`}>{drawing.title}</title>
          <desc id={`${id}-d`}>{drawing.description}</desc>
        </>
      )}
      {hatched.length > 0 && (
        <defs>
          {hatched.map((of) => (
            <pattern key={of} id={hatchOf(of)} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
              <path d="M0 0V7" stroke={ink(of)} strokeWidth="1.6" />
            </pattern>
          ))}
        </defs>
      )}
      {drawing.shapes.map((shape, i) => (
        <Fragment key={i}>{paint(shape, hatchOf)}</Fragment>
      ))}
      {shownMark !== undefined &&
        drawing.shapes.map((shape, i) => (shape.kind === 'path' && shape.mark === shownMark ? <path key={`shown-${i}`} d={shape.d} fill="none" stroke="var(--lb-text)" strokeWidth="2" pointerEvents="none" /> : null))}
    </svg>
  );
  return withTable && drawing.table ? (
    <figure className="lb-figure">
      {picture}
      <details>
        <summary>{withTable}</summary>
        <table className="lb-figures">
          <thead>
            <tr>{drawing.table.columns.map((c) => <th key={c} scope="col">{c}</th>)}</tr>
          </thead>
          <tbody>
            {drawing.table.rows.map((row, i) => (
              <tr key={i}>{row.map((cell, j) => <td key={j} className="num">{cell}</td>)}</tr>
            ))}
          </tbody>
        </table>
      </details>
    </figure>
  ) : (
    picture
  );
}

function paint(shape: Shape, hatchOf: (ink: Ink) => string): ReactNode {
  const mark = shape.mark ? { 'data-mark': shape.mark } : {};
  switch (shape.kind) {
    case 'path':
      return (
        <path
          d={shape.d}
          fill={shape.fill ? ink(shape.fill) : 'none'}
          stroke={shape.stroke ? ink(shape.stroke) : 'none'}
          strokeWidth={shape.strokeWidth}
          strokeDasharray={shape.dash?.join(' ')}
          strokeLinecap={shape.cap}
          fillRule={shape.evenOdd ? 'evenodd' : undefined}
          opacity={shape.opacity}
          {...mark}
        />
      );
    case 'circle':
      return <circle cx={shape.cx} cy={shape.cy} r={shape.r} fill={shape.fill ? ink(shape.fill) : 'none'} stroke={shape.stroke ? ink(shape.stroke) : 'none'} strokeWidth={shape.strokeWidth} {...mark} />;
    case 'rect':
      return (
        <rect x={shape.x} y={shape.y} width={shape.width} height={shape.height} rx={shape.radius} fill={shape.fill ? ink(shape.fill) : 'none'} stroke={shape.stroke ? ink(shape.stroke) : 'none'} strokeWidth={shape.strokeWidth} {...mark} />
      );
    case 'text':
      return (
        <text x={shape.x} y={shape.y} fontSize={shape.size} fontWeight={shape.weight} textAnchor={shape.anchor} fill={ink(shape.ink)} {...mark}>
          {shape.text}
        </text>
      );
    case 'hatch':
      return <rect x={shape.x} y={shape.y} width={shape.width} height={shape.height} fill={`url(#${hatchOf(shape.ink)})`} opacity={0.55} {...mark} />;
  }
}
