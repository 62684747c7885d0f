import type { RecordView } from '@shared/records';
import type { SignOff } from '@shared/waivers';
import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server, somebody } from '../../../../test/in-shop.js';
import { jobSheet } from '../job-sheet.fixture.js';
import { CertificatePanel } from './certificate-panel.js';
import { DecisionPanel } from './decision-panel.js';
import { DeliveryPanel } from './delivery-panel.js';
import { FinalSignatures } from './final-signatures.js';
import { WaiverPanel } from './waiver-panel.js';

const person = userEvent.setup();
const sign = (over: Partial<SignOff>): SignOff => ({ id: 's-000001', kind: 'tested', recordId: '01a1e900-final', by: 'Jonas Feldt', byRoles: 'technician', at: '2026-11-23T11:00:00.000Z', reason: '', detail: {}, contentHash: 'rev-1', version: 1, ...over });
const finalTest: RecordView = {
  id: '01a1e900-final',
  jobId: '01a1e84e-0012',
  kind: 'final-test',
  ordinal: 1,
  revision: 2,
  verdict: 'conforms',
  readings: {},
  entered: {},
  result: {},
  calculation: 'machine-tests/1',
  limitsVersion: 1,
  instruments: [],
  reason: '',
  by: 'Jonas Feldt',
  at: '2026-11-23T11:00:00.000Z',
  contentHash: 'rev-1',
  version: 2,
};
const button = (name: string) => screen.getByRole('button', { name });
const none = (name: string) => expect(screen.queryByRole('button', { name })).toBeNull();
const posts = (asked: ReturnType<typeof server>) => asked.filter((a) => a.method === 'POST');

afterEach(() => vi.unstubAllGlobals());

describe('signatures on the job sheet', () => {
  it('signs the final test for the revision that was read, with the person’s own password', async () => {
    const asked = server(() => [201, sign({})]);
    inShop(<FinalSignatures job={jobSheet()} record={finalTest} />);
    none('Release as second person…');
    await person.click(button('Sign the final test…'));
    expect(await screen.findByText(/revision 2 of the final test/)).toBeDefined();
    await person.type(screen.getByLabelText('Your own password'), 'copper and patience');
    await person.click(button('Sign'));
    await waitFor(() => expect(posts(asked)[0]).toMatchObject({ path: '/records/01a1e900-final/signature', body: { version: 2, password: 'copper and patience' } }));
  });

  it('asks for a second person once the technician has signed, and says who that cannot be', async () => {
    server(() => refusal(409, 'SAME_PERSON', 'Who signed the test does not release it: a second person does.'));
    inShop(<FinalSignatures job={jobSheet({ signOffs: [sign({})] })} record={finalTest} />);
    none('Sign the final test…');
    await person.click(button('Release as second person…'));
    await person.type(await screen.findByLabelText('Your own password'), 'copper and patience');
    await person.click(button('Sign'));
    expect(await screen.findByText('Who signed the test does not release it: a second person does.')).toBeDefined();
  });

  it('asks for a new signature after a correction', () => {
    inShop(<FinalSignatures job={jobSheet({ signOffs: [sign({ contentHash: 'rev-0' })] })} record={finalTest} />);
    expect(screen.getByText('It was corrected since it was signed: sign it anew.')).toBeDefined();
  });

  it('lets a technician ask for a waiver with a reason, and only a manager countersign it', async () => {
    const asked = server(() => [201, sign({ kind: 'waiver', recordId: null })]);
    inShop(<WaiverPanel job={jobSheet()} testMade={false} />, { me: somebody(['technician']) });
    await person.click(screen.getByText('No core test before?'));
    await person.click(button('Ask for a waiver…'));
    await person.click(await screen.findByRole('button', { name: 'Ask the manager' }));
    expect(await screen.findByText('Say what the case is.')).toBeDefined();
    await person.selectOptions(screen.getByLabelText('Why can it not be made?'), 'came-in-stripped');
    await person.type(screen.getByLabelText('What is the case?'), 'Stripped by another shop.');
    await person.click(button('Ask the manager'));
    await waitFor(() => expect(posts(asked)[0]).toMatchObject({ path: '/jobs/01a1e84e-0012/waiver', body: { reason: 'came-in-stripped', words: 'Stripped by another shop.' } }));
  });

  it('shows a technician that the waiver waits, without the button that is the manager’s', () => {
    const waiting = jobSheet({ signOffs: [sign({ kind: 'waiver', recordId: null, reason: 'Stripped by another shop.' })] });
    inShop(<WaiverPanel job={waiting} testMade={false} />, { me: somebody(['technician']) });
    expect(screen.getByText('It waits for a manager’s countersignature.')).toBeDefined();
    none('Countersign the waiver…');
  });

  it('needs no waiver once a valid test is there', () => {
    inShop(<WaiverPanel job={jobSheet()} testMade />);
    expect(screen.queryByText('No core test before?')).toBeNull();
  });

  it('records the customer’s answer with who gave it and how', async () => {
    const asked = server(() => [201, sign({ kind: 'decision' })]);
    inShop(<DecisionPanel job={jobSheet()} record={{ ...finalTest, kind: 'core-test-after' }} about="core-test-after" />, { me: somebody(['counter']) });
    await person.click(button('Record the answer…'));
    await person.selectOptions(await screen.findByLabelText('What does the customer want?'), 'repair-and-retest');
    await person.type(screen.getByLabelText('Who answered?'), 'Gesa Fennholt');
    await person.click(screen.getByRole('radio', { name: 'by phone' }));
    await person.click(button('Record the answer'));
    await waitFor(() => expect(posts(asked)[0]?.body).toEqual({ recordId: '01a1e900-final', about: 'core-test-after', choice: 'repair-and-retest', answeredBy: 'Gesa Fennholt', channel: 'phone', words: '' }));
  });
});

describe('what goes out with the machine', () => {
  const certificate = { id: '01a1e900-cert', kind: 'certificate', number: 'C2026-0003', issuedAt: '2026-11-30T10:00:00.000Z', supersededBy: null };
  const released = (met: boolean) => ({ gate: 'released' as const, open: false, before: 'released' as const, conditions: [
    { code: 'CERTIFICATE', met, words: met ? 'Certificate issued.' : 'Issue the certificate.', place: 'certificate' },
    { code: 'DELIVERY_NOTE', met: false, words: 'Have the delivery note signed.', place: 'delivery' },
  ] });

  it('replaces a certificate only with a reason', async () => {
    const asked = server(() => [201, { ...certificate, number: 'C2026-0004', sha256: null, verificationCode: null }]);
    inShop(<CertificatePanel job={jobSheet({ step: 'ready', papers: [certificate] })} />);
    await person.click(screen.getByText('Something on it is wrong?'));
    await person.click(button('Issue a new certificate'));
    expect(await screen.findByText('A new one replaces it: say why.')).toBeDefined();
    expect(posts(asked)).toEqual([]);
    await person.type(screen.getByLabelText('Why is it replaced?'), 'Serial misspelt');
    await person.click(screen.getByRole('radio', { name: 'Letter' }));
    await person.click(button('Issue a new certificate'));
    await waitFor(() => expect(posts(asked)[0]?.body).toEqual({ jobVersion: 12, paperSize: 'Letter', units: 'si', reason: 'Serial misspelt' }));
  });

  it('does not let a machine be signed for while something else is missing', () => {
    inShop(<DeliveryPanel job={jobSheet({ step: 'ready', gates: [released(false)] })} />);
    expect(screen.getByText('Issue the certificate.')).toBeDefined();
    none('Record the delivery');
  });

  it('asks who takes the machine, and nothing else first', async () => {
    const asked = server(() => [201, { signOff: sign({ kind: 'delivery' }), paperId: '01a1e900-note', number: 'L2026-0003' }]);
    inShop(<DeliveryPanel job={jobSheet({ step: 'ready', gates: [released(true)] })} />, { me: somebody(['counter']) });
    await person.click(button('Record the delivery'));
    expect(await screen.findByText('Who takes it?', { selector: '[role=alert]' })).toBeDefined();
    await person.type(screen.getByLabelText('Who takes it?'), 'Timo Pakkarinen');
    await person.click(button('Record the delivery'));
    await waitFor(() => expect(posts(asked)[0]?.body).toEqual({ receivedBy: 'Timo Pakkarinen', words: '', version: 12 }));
  });
});
