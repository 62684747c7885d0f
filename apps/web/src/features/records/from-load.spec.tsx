import type { JobLoad } from '@shared/burnouts';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { FormProvider, useForm } from 'react-hook-form';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it, vi } from 'vitest';
import { untyped } from '../../lib/typed.js';
import { FromLoad } from './components/from-load.js';
import type { RecordContext } from './record-definition.js';
import { stripForm, takenFromLoad, type StripValues } from './strip-form.js';

const load: JobLoad = {
  id: '01a1c1e5-load-0002',
  number: 2,
  ovenId: 'O1',
  ovenName: 'O1',
  day: '2026-11-04',
  limitC: 370,
  limitReason: 'unknown',
  fileName: 'night.csv',
  peakC: 356.04,
  hottest: 'TC1 tooth',
  minutesAboveLimit: 0,
  minutesAbove345C: 94.6,
  verdict: 'conforms',
  reasons: [],
  by: 'Jonas Feldt',
  createdAt: '2026-11-04T20:00:00.000Z',
  version: 2,
  own: { limitC: 370, limitReason: 'unknown', overK: -13.96 },
  others: 1,
};
const typed: StripValues = { method: null, ovenId: null, commutatorOrSlipRingsOn: false, wiresCountedAtCut: untyped('si'), sampleCoilKept: true, partPeakC: untyped('si'), minutesAbove345C: untyped('si'), sensorPosition: '', explanation: '' };

function Form({ loads, onSave = () => undefined }: { readonly loads: readonly JobLoad[]; readonly onSave?: (values: StripValues) => void }) {
  const form = useForm<StripValues>({ defaultValues: typed });
  return (
    <MemoryRouter>
      <FormProvider {...form}>
        <FromLoad context={{ loads, system: 'si' } as unknown as RecordContext} />
        <input type="submit" value="Save" onClick={() => onSave(form.getValues())} />
      </FormProvider>
    </MemoryRouter>
  );
}

describe('a strip record beside the load of its job', () => {
  it('takes peak, minutes, oven and sensor over by one tap, and the record then says just that', async () => {
    const onSave = vi.fn<(values: StripValues) => void>();
    render(<Form loads={[load]} onSave={onSave} />);
    await userEvent.click(screen.getByRole('button', { name: /^Take over 356/ }));
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    const { readings, problems } = stripForm.read(onSave.mock.calls[0]![0]);
    expect(problems).toEqual([]);
    expect(readings).toMatchObject({ method: 'oven-burnout', ovenId: 'O1', partPeakC: 356, minutesAbove345C: 95, sensorPosition: 'TC1 tooth', sampleCoilKept: true });
    expect(screen.getByRole('link', { name: /Load 2 in O1/ }).getAttribute('href')).toBe(`/bay/burnouts/${load.id}`);
  });
  it('leaves alone where the sensor sat, once somebody has typed it', () => {
    expect(takenFromLoad(load, { sensorPosition: 'back iron' }, 'si')).not.toHaveProperty('sensorPosition');
  });
  it('in inch-pound it is typed in Fahrenheit and reads back as the same temperature', () => {
    const { readings } = stripForm.read({ ...typed, ...takenFromLoad(load, typed, 'inch-pound') });
    expect(readings.partPeakC).toBeCloseTo(356, 1);
  });
  it('a load without its file offers nothing to take', () => {
    render(<Form loads={[{ ...load, peakC: null, minutesAbove345C: null, hottest: null, verdict: null }]} />);
    expect(screen.getByText('file still to come')).toBeDefined();
    expect(screen.queryByRole('button', { name: /^Take over/ })).toBeNull();
  });
  it('is silent where the job stood in no load', () => {
    render(<Form loads={[]} />);
    expect(screen.queryByText('From the logger')).toBeNull();
  });
});
