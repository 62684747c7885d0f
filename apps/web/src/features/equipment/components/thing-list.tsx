import { Button } from '@blueprintjs/core';
import { Plus } from '@blueprintjs/icons';
import { useState, type ReactNode } from 'react';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { Panel } from '../../../components/panel.js';
import { t } from '../text.js';
import './equipment.css';

export interface ShownThing {
  readonly key: string;
  /** as it is typed; empty for a new one */
  readonly name: string;
  /** a new one goes without being asked about */
  readonly isNew: boolean;
}

interface ThingListProps {
  readonly title: string;
  readonly help: string;
  readonly none: string;
  readonly add: string;
  readonly things: readonly ShownThing[];
  /** what a thing without a name is called */
  readonly nameOf: (n: number) => string;
  readonly mayEdit: boolean;
  readonly onAdd: () => void;
  readonly onRemove: (index: number) => void;
  readonly fields: (index: number) => ReactNode;
}

/** One list of the bay: each thing with its fields, added and taken off by buttons. */
export function ThingList({ title, help, none, add, things, nameOf, mayEdit, onAdd, onRemove, fields }: ThingListProps) {
  const [asked, setAsked] = useState<number | null>(null);
  const name = (i: number) => things[i]?.name.trim() || nameOf(i + 1);
  return (
    <Panel title={title} actions={mayEdit && <Button icon={<Plus />} text={add} onClick={onAdd} />}>
      <p className="muted">{things.length === 0 ? none : help}</p>
      {things.map((thing, i) => (
        <fieldset key={thing.key} className="lb-thing" disabled={!mayEdit}>
          <legend>
            {name(i)} {thing.isNew && <span className="muted">({t('newOne')})</span>}
          </legend>
          <div className="fields">{fields(i)}</div>
          {mayEdit && (
            <div className="lb-thing-foot">
              <Button variant="minimal" text={t('remove')} aria-label={t('removeNamed', { name: name(i) })} onClick={() => (thing.isNew ? onRemove(i) : setAsked(i))} />
            </div>
          )}
        </fieldset>
      ))}
      <ConfirmDialog
        open={asked !== null}
        title={t('removeTitle', { name: asked === null ? '' : name(asked) })}
        confirm={t('removeConfirm')}
        cancel={t('keepIt')}
        onConfirm={() => {
          if (asked !== null) onRemove(asked);
          setAsked(null);
        }}
        onClose={() => setAsked(null)}
      >
        <p>{t('removeWords')}</p>
      </ConfirmDialog>
    </Panel>
  );
}
