import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server } from '../../../../test/in-shop.js';
import { UploadBox } from './upload-box.js';

const person = userEvent.setup({ applyAccept: false });
const file = (name: string, type: string, bytes = 12) => new File([new Uint8Array(bytes)], name, { type });
const kept = (name: string) => [201, { id: '01a231e9-photo', name, mime: 'image/png', sizeBytes: 12, addedBy: 'Rolf Steenbeck', addedAt: '2026-12-01T10:00:00.000Z', recordId: null }] as const;
const choose = (files: File[]) => person.upload(screen.getByLabelText('Choose files', { selector: 'input' }), files);

afterEach(() => vi.unstubAllGlobals());

describe('adding photos to a job', () => {
  it('sends each file for itself and says of each how it went', async () => {
    const asked = server(({ body }) => {
      const { name } = (body as FormData).get('file') as File;
      return name === 'plate.png' ? kept(name) : refusal(422, 'FILE_NOT_ACCEPTED', 'This is no picture we can read. Take it again.');
    });
    inShop(<UploadBox jobId="01a1e84e-0012" />);
    await choose([file('plate.png', 'image/png'), file('broken.jpg', 'image/jpeg')]);
    expect(await screen.findByText('plate.png is here.')).toBeDefined();
    expect(await screen.findByText('broken.jpg: This is no picture we can read. Take it again.')).toBeDefined();
    expect(screen.queryByRole('button', { name: 'Try again' })).toBeNull();
    expect(new Set(asked.map((a) => a.idempotencyKey)).size).toBe(2);
  });

  it('does not send what is no picture and no PDF, or too large', async () => {
    const asked = server(() => kept('x'));
    inShop(<UploadBox jobId="01a1e84e-0012" />);
    await choose([file('notes.txt', 'text/plain'), file('film.png', 'image/png', 15 * 1024 * 1024 + 1)]);
    expect(await screen.findByText(/notes.txt: This is no picture and no PDF/)).toBeDefined();
    expect(await screen.findByText(/film.png: This file has 15.7.MB/)).toBeDefined();
    expect(asked).toEqual([]);
  });

  it('tries a file again with the same key when the connection was lost', async () => {
    let reachable = false;
    const asked = server(() => (reachable ? kept('plate.png') : undefined));
    inShop(<UploadBox jobId="01a1e84e-0012" />);
    await choose([file('plate.png', 'image/png')]);
    const again = await screen.findByRole('button', { name: 'Try again' });
    reachable = true;
    await person.click(again);
    await waitFor(() => expect(screen.getByText('plate.png is here.')).toBeDefined());
    expect(asked[0]?.idempotencyKey).toBe(asked[1]?.idempotencyKey);
  });
});
