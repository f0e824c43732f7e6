import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { ApiProvider } from '@/shared/ui/api/ApiProvider';
import { AccountScreen } from '@/shared/ui/screens/workshop/AccountScreen';
import { deviceWords } from '@/shared/ui/screens/workshop/deviceWords';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

const PHONE = '11111111-1111-4111-8111-111111111111';
const at = '2026-01-05T09:00:00.000Z';
const here = { id: '22222222-2222-4222-8222-222222222222', device: 'Mozilla/5.0 (X11; Linux x86_64) Chrome/150 Safari/537', since: at, lastSeen: at, current: true };
const phone = { id: PHONE, device: 'Mozilla/5.0 (Android 15; Mobile) Firefox/150.0', since: at, lastSeen: at, current: false };

/** A server with sessions, which answers a change of password as it is told. */
function serverWith(password: { status: number; body: unknown } = { status: 201, body: { done: true } }) {
  const asked: string[] = [];
  let sessions = [here, phone];
  vi.stubGlobal('fetch', async (path: string, init?: RequestInit) => {
    asked.push(`${init?.method ?? 'GET'} ${path}`);
    const reply = (status: number, body: unknown) => Promise.resolve(new Response(JSON.stringify(body), { status }));
    if (init?.method === 'DELETE') {
      sessions = sessions.filter((session) => !path.endsWith(session.id));
      return reply(200, { done: true });
    }
    if (path === '/api/password') return reply(password.status, password.body);
    return reply(200, { sessions });
  });
  return asked;
}

function show() {
  renderSheet(
    <ApiProvider>
      <AccountScreen />
    </ApiProvider>,
  );
}

function change(now: string, next: string) {
  fireEvent.change(screen.getByLabelText('Password of now'), { target: { value: now } });
  fireEvent.change(screen.getByLabelText('New password'), { target: { value: next } });
  fireEvent.click(screen.getByRole('button', { name: 'Change the password' }));
}

afterEach(() => vi.unstubAllGlobals());

describe('AccountScreen', () => {
  it('ends another session, never this one', async () => {
    const asked = serverWith();
    show();
    const list = await screen.findByRole('list', { name: 'Signed in on' });
    expect(within(list).getAllByRole('button')).toHaveLength(1);
    expect(within(list).getByText('Chrome or Chromium on Linux (this one)')).toBeTruthy();
    fireEvent.click(within(list).getByRole('button', { name: /End the session of Firefox on Android/ }));
    await waitFor(() => expect(screen.queryByText('Firefox on Android')).toBeNull());
    expect(asked).toContain(`DELETE /api/sessions/${PHONE}`);
  });

  it('changes the password, says so, and empties the fields', async () => {
    serverWith();
    show();
    change('old words', 'kettle plank ruby fog');
    await screen.findByText(/Your password is changed/);
    expect((screen.getByLabelText('New password') as HTMLInputElement).value).toBe('');
  });

  it('asks the server nothing for a password that is too short', async () => {
    const asked = serverWith();
    show();
    change('old words', 'short');
    await screen.findByText('at least 10 characters');
    expect(asked).not.toContain('POST /api/password');
  });

  it.each([
    ['wrong-password', 'The password is not right. Nothing was signed.', 'This is not your password of now.'],
    ['weak-password', 'This password is too weak. Add another word.', 'This password is too weak. Add another word.'],
    ['too-many', 'Too many wrong passwords. Wait 15 minutes, then try again.', 'Too many wrong passwords. Wait 15 minutes, then try again.'],
  ])('after %s says what is wrong and keeps what was typed', async (code, say, shown) => {
    serverWith({ status: code === 'too-many' ? 429 : 422, body: { code, say } });
    show();
    change('old words', 'kettle plank ruby fog');
    await screen.findByText(shown);
    expect((screen.getByLabelText('New password') as HTMLInputElement).value).toBe('kettle plank ruby fog');
  });
});

describe('deviceWords', () => {
  it.each([
    ['Mozilla/5.0 (iPhone; CPU iPhone OS 18_0 like Mac OS X) AppleWebKit/605 Version/18.0 Mobile Safari/604.1', 'Safari on an iPhone'],
    ['Mozilla/5.0 (Windows NT 10.0) AppleWebKit/537 Chrome/150 Safari/537 Edg/150', 'Edge on Windows'],
    ['curl/8', 'A browser that does not say which'],
    ['', 'A browser that does not say which'],
  ])('%s', (device, words) => {
    expect(deviceWords(device)).toBe(words);
  });
});
