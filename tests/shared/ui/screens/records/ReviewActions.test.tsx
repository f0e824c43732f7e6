import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { ApiProvider } from '@/shared/ui/api/ApiProvider';
import { ReviewActions } from '@/shared/ui/screens/records/ReviewActions';
import type { ReviewOffers } from '@/shared/ui/screens/records/reviewOffers';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';
import { goodRun } from '@/tests/shared/ui/screens/sampleRecord';

const none: ReviewOffers = { find: false, return: false, accept: false, release: false, reply: false, submit: false, why: [] };
const bench = goodRun();

function show(offers: Partial<ReviewOffers>) {
  renderSheet(
    <ApiProvider>
      <ReviewActions record={bench.record()} offers={{ ...none, ...offers }} />
    </ApiProvider>,
  );
}

/** Answers every request as given and notes what was sent. */
function serverSays(status: number, body: unknown) {
  const sent: { path: string; body: Record<string, unknown> }[] = [];
  vi.stubGlobal('fetch', async (path: string, init?: RequestInit) => {
    sent.push({ path, body: JSON.parse(String(init?.body ?? '{}')) as Record<string, unknown> });
    return new Response(JSON.stringify(body), { status });
  });
  return sent;
}

afterEach(() => vi.unstubAllGlobals());

describe('ReviewActions', () => {
  it('offers a reviewer to return and to accept', () => {
    show({ find: true, return: true, accept: true });
    expect(screen.getByRole('button', { name: 'Return' })).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Accept and sign' })).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Answer and submit again' })).toBeNull();
  });

  it('offers the restorer neither, and says why', () => {
    show({ why: ['This is your own run: another person reviews it.'] });
    expect(screen.queryByRole('button', { name: 'Accept and sign' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Return' })).toBeNull();
    expect(screen.getByText(/your own run/)).toBeTruthy();
  });

  it('shows what the signature means and offers no release where none can go with it', () => {
    show({ accept: true });
    fireEvent.click(screen.getByRole('button', { name: 'Accept and sign' }));
    const dialog = within(screen.getByRole('dialog', { name: 'Accept and sign' }));
    expect((dialog.getByLabelText('Your signature means') as HTMLTextAreaElement).value).toContain('I took no part in this run');
    expect(dialog.queryByRole('checkbox')).toBeNull();
  });

  it('asks for the password before anything is sent, and says at the field when it is wrong', async () => {
    const sent = serverSays(422, { code: 'wrong-password', say: 'The password is not right. Nothing was signed.' });
    show({ accept: true, release: true });
    fireEvent.click(screen.getByRole('button', { name: 'Accept and sign' }));
    const dialog = within(screen.getByRole('dialog'));
    fireEvent.click(dialog.getByRole('button', { name: 'Accept and sign' }));
    await dialog.findByText('the password is missing');
    expect(sent).toEqual([]);

    fireEvent.change(dialog.getByLabelText('Your password'), { target: { value: 'wrong' } });
    fireEvent.click(dialog.getByRole('checkbox', { name: /Release: supply proven/ }));
    fireEvent.click(dialog.getByRole('button', { name: 'Accept and sign' }));
    await dialog.findByText('The password is not right. Nothing was signed.');
    fireEvent.click(dialog.getByRole('button', { name: 'Accept and sign' }));
    await waitFor(() => expect(sent).toHaveLength(2));
    expect(sent[0]?.body).toMatchObject({ password: 'wrong', release: true });
    // a second try is the same act
    expect(sent[1]?.body['id']).toBe(sent[0]?.body['id']);
  });

  it('wants every question filled in, and keeps them when the record was returned by somebody else meanwhile', async () => {
    const sent = serverSays(409, { code: 'wrong-state', say: 'Only a record under review can be returned.' });
    show({ return: true });
    fireEvent.click(screen.getByRole('button', { name: 'Return' }));
    const dialog = within(screen.getByRole('dialog', { name: 'Return with questions' }));
    fireEvent.click(dialog.getByRole('button', { name: 'Another question' }));
    fireEvent.change(dialog.getByLabelText('Question 1'), { target: { value: 'Which load was on?' } });
    fireEvent.click(dialog.getByRole('button', { name: 'Return it' }));
    await dialog.findByText('write something here');
    expect(sent).toEqual([]);
    fireEvent.change(dialog.getByLabelText('Question 2'), { target: { value: 'Why was the lamp bright?' } });
    fireEvent.click(dialog.getByRole('button', { name: 'Return it' }));
    await dialog.findByText('Only a record under review can be returned.');
    expect(sent[0]?.body['questions']).toEqual(['Which load was on?', 'Why was the lamp bright?']);
    expect((dialog.getByLabelText('Question 1') as HTMLTextAreaElement).value).toBe('Which load was on?');
  });
});
