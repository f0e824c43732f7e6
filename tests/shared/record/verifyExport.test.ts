import { createPublicKey, verify } from 'node:crypto';

import { exportJWK, FlattenedSign, generateKeyPair } from 'jose';
import { describe, expect, it } from 'vitest';

import { exportBytes, readExport } from '@/shared/record/exportFormat';
import { signExport, verifyExport } from '@/shared/record/verifyExport';
import { sampleExport } from '@/tests/shared/record/sampleExport';

async function keyed(kid: string) {
  const { publicKey, privateKey } = await generateKeyPair('EdDSA', { extractable: true });
  return { privateKey, jwks: { keys: [{ ...(await exportJWK(publicKey)), kid, alg: 'EdDSA', use: 'sig' }] } };
}

describe('verifyExport', () => {
  it('trusts what was signed with the published key', async () => {
    const { privateKey, jwks } = await keyed('k1');
    const file = await signExport(sampleExport(), privateKey, 'k1');
    expect(Object.keys(file)).toEqual(['payload', 'protected', 'signature']);
    expect(await verifyExport(JSON.stringify(file), jwks)).toMatchObject({
      ok: true,
      trusted: true,
      signature: { state: 'good', kid: 'k1' },
    });
  });

  it('can be checked without this program: plain Ed25519 over protected.payload', async () => {
    const { privateKey, jwks } = await keyed('k1');
    const file = await signExport(sampleExport(), privateKey, 'k1');
    const key = createPublicKey({ key: jwks.keys[0] ?? {}, format: 'jwk' });
    expect(verify(null, Buffer.from(`${file.protected}.${file.payload}`), key, Buffer.from(file.signature, 'base64url'))).toBe(true);
  });

  it('does not trust one changed character of payload, header or signature', async () => {
    const { privateKey, jwks } = await keyed('k1');
    const exported = sampleExport();
    const file = await signExport(exported, privateKey, 'k1');
    const forged = { ...exported, record: { ...exported.record, machine: { ...exported.record.machine, serial: '00418' } } };
    const payload = Buffer.from(exportBytes(forged)).toString('base64url');
    const signature = `${file.signature.startsWith('A') ? 'B' : 'A'}${file.signature.slice(1)}`;
    const header = Buffer.from('{"alg":"EdDSA","kid":"k1","typ":"other"}').toString('base64url');
    for (const change of [{ payload }, { signature }, { protected: header }]) {
      const verdict = await verifyExport(JSON.stringify({ ...file, ...change }), jwks);
      expect(verdict).toMatchObject({ ok: true, trusted: false, signature: { state: 'bad' } });
    }
  });

  it('does not trust a good signature over a broken chain', async () => {
    const { privateKey, jwks } = await keyed('k1');
    const exported = sampleExport();
    const file = await signExport({ ...exported, entries: exported.entries.toSpliced(2, 1) }, privateKey, 'k1');
    expect(await verifyExport(JSON.stringify(file), jwks)).toMatchObject({
      trusted: false,
      signature: { state: 'good' },
      chain: { ok: false, seq: 3 },
    });
  });

  it('says when the key is not published, and when the key under that name is another one', async () => {
    const { privateKey } = await keyed('k1');
    const file = JSON.stringify(await signExport(sampleExport(), privateKey, 'k1'));
    expect(await verifyExport(file, (await keyed('k2')).jwks)).toMatchObject({ trusted: false, signature: { state: 'unknown-key' } });
    expect(await verifyExport(file, (await keyed('k1')).jwks)).toMatchObject({ trusted: false, signature: { state: 'bad' } });
    expect(await verifyExport(file, { keys: [{ kty: 'OKP', crv: 'Ed25519', kid: 'k1', x: 'AA' }] })).toMatchObject({ trusted: false });
  });

  it('does not take a signature made with a shared secret, nor one for another kind of document', async () => {
    const secret = new Uint8Array(32).fill(7);
    const hs = await new FlattenedSign(exportBytes(sampleExport())).setProtectedHeader({ alg: 'HS256', kid: 'k1' }).sign(secret);
    const jwks = { keys: [{ kty: 'oct', kid: 'k1', k: Buffer.from(secret).toString('base64url') }] };
    expect(await verifyExport(JSON.stringify(hs), jwks)).toMatchObject({ trusted: false, signature: { state: 'bad' } });

    const { privateKey, jwks: good } = await keyed('k1');
    const other = await new FlattenedSign(exportBytes(sampleExport()))
      .setProtectedHeader({ alg: 'EdDSA', kid: 'k1', typ: 'jwt' })
      .sign(privateKey);
    expect(await verifyExport(JSON.stringify(other), good)).toMatchObject({ trusted: false, signature: { state: 'bad' } });
  });

  it('reads an unreadable file as such', async () => {
    expect(await verifyExport('{}', { keys: [] })).toEqual(readExport('{}'));
  });
});
