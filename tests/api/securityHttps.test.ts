import { afterAll, describe, expect, it } from 'vitest';
import { makePerson, startApi, testPassword } from '../support/api';

/** Behind a balancer that speaks https; numbers of OWASP ASVS 5.0 beside the checks. */
const api = await startApi({ PUBLIC_URL: 'https://tapeline.example' });
afterAll(() => api.close());

const https = { 'X-Forwarded-Proto': 'https', Host: 'tapeline.example' };

describe('on https', () => {
  it('the cookie is bound to the host and travels encrypted alone (3.3.1, 3.3.3)', async () => {
    const { email } = await makePerson();
    const { headers } = await api.visitor().post('/api/sign-in').set(https).send({ email, password: testPassword });
    const [cookie, ...flags] = String(headers['set-cookie']).split('; ');
    expect(cookie).toMatch(/^__Host-tapeline=s%3A/);
    // RFC 6265bis, 4.1.3.2: the prefix asks for Secure, Path=/ and no Domain
    expect(flags).toEqual(expect.arrayContaining(['Secure', 'HttpOnly', 'SameSite=Lax', 'Path=/']));
    expect(flags.join()).not.toContain('Domain');
    const signedIn = { ...https, Cookie: cookie as string };
    expect((await api.visitor().get('/api/me').set(signedIn)).body.me.email).toBe(email);
    const out = await api.visitor().post('/api/sign-out').set(signedIn).expect(200);
    expect(String(out.get('Set-Cookie'))).toMatch(/^__Host-tapeline=; Path=\/; Expires=.*; HttpOnly; Secure/);
    expect((await api.visitor().get('/api/me').set(signedIn)).body.me).toBeNull();
  });

  it('browsers are told to stay there for a year at least (3.4.1)', async () => {
    const { headers } = await api.visitor().get('/api/me').set(https);
    const seconds = Number(/max-age=(\d+)/.exec(String(headers['strict-transport-security']))?.[1]);
    expect(seconds).toBeGreaterThanOrEqual(365 * 24 * 3600);
    expect(headers['strict-transport-security']).toContain('includeSubDomains');
  });

  it('only the product’s own address counts as its page (3.5.1)', async () => {
    const signOut = (origin: string) =>
      api
        .visitor()
        .post('/api/sign-out')
        .set({ ...https, Origin: origin });
    await signOut('https://tapeline.example').expect(200);
    await signOut('https://tapeline.example.evil.example').expect(403);
    await signOut('http://tapeline.example').expect(403);
  });
});
