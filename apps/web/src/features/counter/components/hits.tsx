interface Hit {
  readonly id: string;
  readonly name: string;
  readonly detail: string;
}

interface HitsProps {
  readonly label: string;
  readonly hits: readonly Hit[];
  readonly chosen: string | null;
  readonly onChoose: (hit: Hit) => void;
}

/** What was found, each large enough for a thumb; the chosen one is marked. */
export function Hits({ label, hits, chosen, onChoose }: HitsProps) {
  if (hits.length === 0) return null;
  return (
    <ul className="lb-hits" role="radiogroup" aria-label={label}>
      {hits.map((hit) => (
        <li key={hit.id} role="none">
          <button type="button" role="radio" aria-checked={hit.id === chosen} onClick={() => onChoose(hit)}>
            <b>{hit.name}</b>
            <span className="muted">{hit.detail}</span>
          </button>
        </li>
      ))}
    </ul>
  );
}
