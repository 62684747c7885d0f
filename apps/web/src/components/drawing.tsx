import type { Drawing as DrawingModel, Paint, Shape } from '@libs/drawings';
import { Fragment, useId, type ReactNode } from 'react';
import './drawing.css';

const ink = (paint: Paint): string => (typeof paint === 'string' ? `var(--lb-${paint})` : `color-mix(in srgb, var(--lb-${paint.from}) ${Math.round((1 - paint.share) * 100)}%, var(--lb-${paint.to}))`);

interface DrawingProps {
  readonly drawing: DrawingModel;
  /** in CSS; the drawing keeps its proportions */
  readonly width?: string | number;
  readonly onMark?: (mark: string) => void;
  /** figures behind the picture, offered below it */
  readonly withTable?: string;
  readonly decorative?: boolean;
}

/** Paints a drawing of `@libs/drawings` in the colours of the theme. */
export function Drawing({ drawing, width = '100%', onMark, withTable, decorative = false }: DrawingProps) {
  const id = useId();
  const hatch = `hatch-${id}`;
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
    >
      {!decorative && (
        <>
          <title id={`${id}-t`}>{drawing.title}</title>
          <desc id={`${id}-d`}>{drawing.description}</desc>
        </>
      )}
      <defs>
        <pattern id={hatch} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V7" stroke="currentColor" strokeWidth="1.5" />
        </pattern>
      </defs>
      {drawing.shapes.map((shape, i) => (
        <Fragment key={i}>{paint(shape, hatch)}</Fragment>
      ))}
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

function paint(shape: Shape, hatch: string): ReactNode {
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
      return <rect x={shape.x} y={shape.y} width={shape.width} height={shape.height} fill={`url(#${hatch})`} style={{ color: `var(--lb-${shape.ink})` }} opacity={0.4} {...mark} />;
  }
}
