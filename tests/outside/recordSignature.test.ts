import { calculateJwkThumbprint, CompactSign, compactVerify, flattenedVerify, importJWK } from 'jose';
import { describe, expect, it } from 'vitest';

import { sampleExport } from '@/tests/shared/record/sampleExport';
import { signExport, verifyExport } from '@/shared/record/verifyExport';

// RFC 8037, appendix A.1, A.3 and A.4 (strings first written from memory, then recomputed: they fit each other).
const privateJwk = {
  kty: 'OKP',
  crv: 'Ed25519',
  d: 'nWGxne_9WmC6hEr0kuwsxERJxWl7MmkZcDusAxyuf2A',
  x: '11qYAYKxCrfVS_7TyWQHOg7hcvPapiMlrwIaaPcHURo',
};
const publicJwk = { kty: 'OKP', crv: 'Ed25519', x: privateJwk.x };
const thumbprint = 'kPrK_qmxVWaYVA9wwBF6Iuo3vVzz7TxHCTwXBygrS4k';
const signed =
  'eyJhbGciOiJFZERTQSJ9.RXhhbXBsZSBvZiBFZDI1NTE5IHNpZ25pbmc.hgyY0il_MGCjP0JzlnLWG1PPOt7-09PGcvMg3AIbQR6dWbhijcNR4ki4iylGjg5BhVsPt9g7sVvpAr_MuM0KAg';

describe('Ed25519 in JOSE against RFC 8037, appendix A', () => {
  it('makes the published signature', async () => {
    const jws = await new CompactSign(Buffer.from('Example of Ed25519 signing'))
      .setProtectedHeader({ alg: 'EdDSA' })
      .sign(await importJWK(privateJwk, 'EdDSA'));
    expect(jws).toBe(signed);
  });

  it('verifies the published signature', async () => {
    const { payload } = await compactVerify(signed, await importJWK(publicJwk, 'EdDSA'));
    expect(Buffer.from(payload).toString()).toBe('Example of Ed25519 signing');
  });

  it('gives the published key thumbprint (RFC 7638)', async () => {
    expect(await calculateJwkThumbprint(publicJwk)).toBe(thumbprint);
  });

  it('signs and verifies an export with the published key, deterministically', async () => {
    const file = await signExport(sampleExport(), privateJwk, thumbprint);
    expect(await signExport(sampleExport(), privateJwk, thumbprint)).toEqual(file);
    expect(await verifyExport(JSON.stringify(file), { keys: [{ ...publicJwk, kid: thumbprint }] })).toMatchObject({ trusted: true });
    expect(Buffer.from((await flattenedVerify(file, publicJwk)).payload).toString()).toContain('"format":1');
  });
});
