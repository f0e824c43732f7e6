import { describe, expect, it } from 'vitest';

import { createClient } from '@/shared/ui/api/client';

interface Reply {
  status: number;
  body: unknown;
}

/** A server that gives its replies in order and notes what it was asked. */
function serverOf(replies: (Reply | 'away')[]) {
  const asked: { line: string; body: string | null }[] = [];
  const send: typeof fetch = async (url, init) => {
    asked.push({ line: `${init?.method ?? 'GET'} ${String(url)}`, body: typeof init?.body === 'string' ? init.body : null });
    const reply = replies[asked.length - 1];
    if (reply === undefined || reply === 'away') throw new TypeError('Failed to fetch');
    return new Response(typeof reply.body === 'string' ? reply.body : JSON.stringify(reply.body), { status: reply.status });
  };
  return { asked, client: createClient(send) };
}

const me = {
  person: { id: '11111111-1111-4111-8111-111111111111', code: 'RA', name: 'Ann', mail: 'restorer@example.org' },
  workshop: { id: '22222222-2222-4222-8222-222222222222', name: 'Workshop' },
  workshops: [],
  roles: ['restorer'],
  expiresAt: '2026-01-05T09:00:00.000Z',
};
const expired = { status: 401, body: { code: 'session-expired', say: 'Your session has run out. Sign in again to go on.' } };

describe('createClient', () => {
  it('gives the data of a good answer', async () => {
    const { client, asked } = serverOf([{ status: 200, body: { machines: [] } }]);
    expect(await client.call('machines', {})).toEqual({ kind: 'ok', data: { machines: [] } });
    expect(asked[0]?.line).toBe('GET /api/machines');
  });

  it('sends a file as a form, and again after the session was renewed', async () => {
    const forms: FormData[] = [];
    const replies = [expired, { status: 200, body: me }, { status: 201, body: { hash: 'a'.repeat(64), media: 'image/jpeg', bytes: 3, width: 1, height: 1 } }];
    const client = createClient(async (_url, init) => {
      if (init?.body instanceof FormData) forms.push(init.body);
      const reply = replies.shift();
      return Promise.resolve(new Response(JSON.stringify(reply?.body), { status: reply?.status ?? 500 }));
    });
    const answer = await client.upload('addFile', { query: { as: 'photo' } }, new Blob(['abc']));
    expect(answer).toMatchObject({ kind: 'ok', data: { bytes: 3 } });
    expect(forms.map((form) => (form.get('file') as File).size)).toEqual([3, 3]);
  });

  it('fills parameters and query into the address', async () => {
    const { client, asked } = serverOf([{ status: 200, body: { entries: [], head: { seq: 3, hash: 'a' } } }]);
    await client.call('entries', { params: { run: '0198c0de-0000-7000-8000-000000000001' }, query: { after: 3 } });
    expect(asked[0]?.line).toBe('GET /api/runs/0198c0de-0000-7000-8000-000000000001/entries?after=3');
  });

  it('renews the session once and asks again', async () => {
    const { client, asked } = serverOf([expired, { status: 200, body: me }, { status: 200, body: { machines: [] } }]);
    expect((await client.call('machines', {})).kind).toBe('ok');
    expect(asked.map((a) => a.line)).toEqual(['GET /api/machines', 'POST /api/session/refresh', 'GET /api/machines']);
  });

  it('says that the session is over when it cannot be renewed, and asks no third time', async () => {
    const { client, asked } = serverOf([
      expired,
      { status: 401, body: { code: 'signed-out', say: 'You are not signed in. Sign in to go on.' } },
    ]);
    expect(await client.call('machines', {})).toMatchObject({ kind: 'problem', code: 'session-expired' });
    expect(asked).toHaveLength(2);
  });

  it('shares one renewal between calls that meet the same expired session', async () => {
    const { client, asked } = serverOf([
      expired,
      expired,
      { status: 200, body: me },
      { status: 200, body: { machines: [] } },
      { status: 200, body: { machines: [] } },
    ]);
    const answers = await Promise.all([client.call('machines', {}), client.call('machines', {})]);
    expect(answers.map((a) => a.kind)).toEqual(['ok', 'ok']);
    expect(asked.filter((a) => a.line.includes('refresh'))).toHaveLength(1);
  });

  it('does not renew for a wrong password at sign-in', async () => {
    const { client, asked } = serverOf([
      { status: 401, body: { code: 'sign-in-failed', say: 'Mail address and password do not fit together.' } },
    ]);
    expect(await client.call('signIn', { body: { mail: 'a@example.org', password: 'x' } })).toMatchObject({
      code: 'sign-in-failed',
      retryable: false,
    });
    expect(asked).toHaveLength(1);
  });

  it('turns a missing network into a plain sentence and never throws', async () => {
    const { client } = serverOf(['away']);
    const answer = await client.call('machines', {});
    expect(answer).toMatchObject({ kind: 'problem', code: 'no-network', retryable: true });
    expect(answer.kind === 'problem' && answer.say).toMatch(/cannot be reached/);
  });

  it.each([
    [502, '<html>Bad gateway</html>', 'no-network'],
    [500, 'oops', 'bad-answer'],
    [200, '{"machines": 3}', 'bad-answer'],
    [200, 'not json', 'bad-answer'],
  ])('reads status %i with %s as %s', async (status, body, code) => {
    const { client } = serverOf([{ status, body }]);
    expect(await client.call('machines', {})).toMatchObject({ kind: 'problem', code });
  });

  it('keeps rule and details of a refusal', async () => {
    const { client } = serverOf([
      { status: 422, body: { code: 'refused', say: 'No power: earth is not proved.', rule: 'H7', entry: 'e1' } },
    ]);
    const answer = await client.call('machines', {});
    expect(answer).toMatchObject({ code: 'refused', rule: 'H7', say: 'No power: earth is not proved.', details: { entry: 'e1' } });
  });
});
