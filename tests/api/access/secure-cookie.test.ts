import supertest from 'supertest';
import { expect, test } from 'vitest';
import { password, startTestServer } from '../../support/test-server.ts';

test('behind TLS the cookie and the whole site are for TLS only', async () => {
  const server = await startTestServer({ settings: { PUBLIC_URL: 'https://tensions.firm.example' } });
  try {
    const { email } = await server.join(await server.createFirm(), { name: 'Ines Falk', roles: ['engineer'] });
    const reply = await supertest(server.app)
      .post('/api/auth/sign-in/email')
      .set('Origin', 'https://tensions.firm.example')
      .send({ email, password });
    expect(String(reply.headers['set-cookie'])).toMatch(/^__Secure-.*;\s*Secure/i);
    expect(reply.headers['strict-transport-security']).toMatch(/max-age=\d{7}/);
    expect(reply.headers['content-security-policy']).toContain('upgrade-insecure-requests');
  } finally {
    await server.stop();
  }
});
