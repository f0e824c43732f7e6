import { fireEvent, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { FIRST_CAUTION } from '@/flows/document/hazards';
import { ApiProvider } from '@/shared/ui/api/ApiProvider';
import { SignInScreen } from '@/shared/ui/screens/sign-in/SignInScreen';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';
import { moves } from '@/tests/shared/ui/routerDouble';

const me = {
  person: { id: '11111111-1111-4111-8111-111111111111', code: 'AN', name: 'Ann', mail: 'restorer@example.org' },
  workshop: { id: '22222222-2222-4222-8222-222222222222', name: 'Workshop' },
  workshops: [],
  roles: ['restorer'],
  expiresAt: '2026-01-05T09:00:00.000Z',
};

function show(from?: string, expired = false) {
  renderSheet(
    <ApiProvider>
      <SignInScreen from={from} expired={expired} />
    </ApiProvider>,
  );
}

function serverSays(status: number, body: unknown) {
  const fetch = vi.fn(async () => new Response(JSON.stringify(body), { status }));
  vi.stubGlobal('fetch', fetch);
  return fetch;
}

function fill(mail: string, password: string) {
  fireEvent.change(screen.getByLabelText('Mail address'), { target: { value: mail } });
  fireEvent.change(screen.getByLabelText('Password'), { target: { value: password } });
  fireEvent.click(screen.getByRole('button', { name: 'Sign in' }));
}

beforeEach(() => void moves.splice(0));
afterEach(() => vi.unstubAllGlobals());

describe('SignInScreen', () => {
  it('says what Lampstep is and the first caution', () => {
    show();
    expect(screen.getByText(/one safe step at a time/)).toBeTruthy();
    expect(screen.getByText(FIRST_CAUTION)).toBeTruthy();
  });

  it('goes back to where one was', async () => {
    serverSays(201, me);
    show('/records?show=returned', true);
    expect(screen.getByText(/session has run out/)).toBeTruthy();
    fill('Restorer@Example.org', 'secret');
    await waitFor(() => expect(moves).toEqual([{ how: 'replace', to: '/records?show=returned' }]));
  });

  it('asks at the field before it asks the server', async () => {
    const fetch = serverSays(201, me);
    show();
    fill('nobody', '');
    await screen.findByText('this is not a mail address');
    expect(screen.getByText('the password is missing')).toBeTruthy();
    expect(fetch).not.toHaveBeenCalled();
  });

  it.each([
    [401, 'sign-in-failed', 'Mail address and password do not fit together.'],
    [429, 'too-many', 'Too many tries. Wait a moment, then try again.'],
  ] as const)('says what a refusal (%i) means and keeps what was typed', async (status, code, say) => {
    serverSays(status, { code, say });
    show();
    fill('restorer@example.org', 'wrong');
    await screen.findByText(say);
    expect((screen.getByLabelText('Mail address') as HTMLInputElement).value).toBe('restorer@example.org');
    expect(moves).toEqual([]);
  });

  it('says that the server cannot be reached', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
    show();
    fill('restorer@example.org', 'secret');
    await screen.findByText('The server cannot be reached.');
  });
});
