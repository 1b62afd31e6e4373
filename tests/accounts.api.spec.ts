import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Session } from '../shared/accounts/accounts-contract';
import type { ProblemDetails } from '../shared/problems/problems';
import { PASSWORD, startTestApp, type TestApp } from './support/test-app';

let app: TestApp;
beforeAll(async () => void (app = await startTestApp()));
afterAll(() => app.stop());

/** The link of the newest message to an address, as its reader finds it in the text. */
async function linkIn(address: string): Promise<string> {
  await app.deliver();
  const [mail] = await app.rows<{ text: string }>(
    'select text from mailbox where recipient = $1 order by received_at desc limit 1',
    [address],
  );
  return /http:\/\/localhost:4000(\/\S+)/.exec(mail?.text ?? '')?.[1] ?? '';
}
const tokenIn = async (address: string): Promise<string> => (await linkIn(address)).split('/').at(-1) ?? '';

describe('signing up', () => {
  const form = { name: 'Zoë Đặng', email: 'Zoe@new.example', password: 'quiet harbour ledger' };

  it('lets a person in once the address is confirmed, and not before', async () => {
    const client = await app.visitor();
    expect((await client.post('/api/accounts/registrations', form)).status).toBe(202);
    const early = await client.post('/api/accounts/session', { email: form.email, password: form.password });
    expect(early.status).toBe(400);

    const token = await tokenIn('zoe@new.example');
    expect(token).toMatch(/^[\w-]{43}$/);
    expect((await client.post('/api/accounts/confirmations', { token })).status).toBe(200);
    expect((await client.post('/api/accounts/confirmations', { token })).status).toBe(404);

    const session = await client.post<Session>('/api/accounts/session', {
      email: ' zoe@NEW.example',
      password: form.password,
    });
    expect(session.body.person).toMatchObject({ name: 'Zoë Đặng', email: 'zoe@new.example', roles: [] });
    const audit = await app.rows<{ action: string }>(
      "select action from audit_entries join people on people.id::text = subject_id where email = 'zoe@new.example' order by audit_entries.id",
    );
    expect(audit.map((row) => row.action)).toEqual(['accounts.register', 'accounts.confirm-address']);
  });

  it('answers the same for a known address, and tells its owner by mail alone', async () => {
    const known = await app.person({ email: 'known@test.example' });
    const client = await app.visitor();
    const forKnown = await client.post('/api/accounts/registrations', { ...form, email: known.email });
    const forNew = await client.post('/api/accounts/registrations', { ...form, email: 'unknown@test.example' });
    expect([forKnown.status, forKnown.text]).toEqual([forNew.status, forNew.text]);
    const sent = await app.rows<{ template: string }>('select template from messages where address = $1', [
      known.email,
    ]);
    expect(sent.map((row) => row.template)).toEqual(['accounts/address-known']);
    expect((await app.signIn(known)).cookie('heddle')).toBeTruthy();
  });

  it.each([
    ['short words', 'password'],
    ['passwordpassword', 'password'],
    ['0123456789012345', 'password'],
    ['', 'password'],
  ])('refuses the password “%s” with a sentence at the field', async (password) => {
    const client = await app.visitor();
    const answer = await client.post<ProblemDetails>('/api/accounts/registrations', {
      ...form,
      email: 'x@test.example',
      password,
    });
    expect(answer.status).toBe(400);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
    expect(answer.body.fields?.[0]).toMatchObject({ field: 'password' });
  });
});

describe('signing in and out', () => {
  it('gives a new session at sign-in and ends it at sign-out', async () => {
    const person = await app.person({ roles: ['coordinator'] });
    const client = await app.signIn(person);
    const old = client.cookie('heddle');
    const again = await client.post<Session>('/api/accounts/session', { email: person.email, password: PASSWORD });
    expect(again.body.person?.roles).toEqual(['coordinator']);
    expect(client.cookie('heddle')).not.toBe(old);
    const kept = client.cookie('heddle');
    expect((await client.delete('/api/accounts/session')).status).toBe(200);
    const replay = await client.get<Session>('/api/accounts/session', { cookie: `heddle=${kept}` });
    expect(replay.body.person).toBeNull();
  });

  it('slows down guessing, by account, with a time to wait', async () => {
    const person = await app.person();
    const client = await app.visitor();
    const tries = [];
    for (let i = 0; i < 6; i++)
      tries.push(await client.post('/api/accounts/session', { email: person.email, password: 'wrong words here' }));
    expect(tries.slice(0, 4).map((answer) => answer.status)).toEqual([400, 400, 400, 400]);
    expect(tries.at(-1)?.status).toBe(429);
    expect(Number(tries.at(-1)?.headers.get('retry-after'))).toBeGreaterThan(0);
  });

  it('says the same for a wrong password and an unknown address', async () => {
    const person = await app.person();
    const client = await app.visitor();
    const wrong = await client.post('/api/accounts/session', { email: person.email, password: 'not the password' });
    const unknown = await client.post('/api/accounts/session', {
      email: 'nobody@test.example',
      password: 'not the password',
    });
    expect([wrong.status, wrong.text]).toEqual([unknown.status, unknown.text]);
  });

  it('keeps hashes with OWASP’s parameters', async () => {
    const hashes = await app.rows<{ password_hash: string }>(
      'select password_hash from people where password_hash is not null',
    );
    for (const row of hashes) expect(row.password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });
});

describe('a forgotten password', () => {
  it('is replaced by a link that works once, ends all sessions and tells the owner', async () => {
    const person = await app.person({ email: 'forgetful@test.example' });
    const before = await app.signIn(person);
    const client = await app.visitor();
    await client.post('/api/accounts/reset-requests', { email: person.email });
    const token = await tokenIn(person.email);
    const password = 'pebble window trellis';
    const answers = await Promise.all(
      Array.from({ length: 8 }, () => client.post('/api/accounts/password-resets', { token, password })),
    );
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(1);
    expect((await before.get<Session>('/api/accounts/session')).body.person).toBeNull();
    expect((await client.post('/api/accounts/session', { email: person.email, password })).status).toBe(200);
    const sent = await app.rows<{ template: string }>(
      'select template from messages where address = $1 order by created_at',
      [person.email],
    );
    expect(sent.map((row) => row.template)).toEqual(['accounts/reset-password', 'accounts/password-changed']);
    const kept = await app.rows('select 1 from account_tokens where token_hash = $1', [token]);
    expect(kept).toHaveLength(0);
  });

  it('answers the same for an address without an account', async () => {
    const client = await app.visitor();
    const known = await client.post('/api/accounts/reset-requests', { email: 'forgetful@test.example' });
    const unknown = await client.post('/api/accounts/reset-requests', { email: 'nobody@test.example' });
    expect([known.status, known.text]).toEqual([unknown.status, unknown.text]);
  });
});

describe('roles and invitations', () => {
  it('invites the first administrator by a link that is printed once', async () => {
    const invitation = await app.backend.inviteFirstAdministrator();
    const token = invitation?.split('/').at(-1) ?? '';
    const client = await app.visitor();
    expect((await client.get(`/api/accounts/invitations/${token}`)).body).toMatchObject({
      email: null,
      roles: ['administrator'],
    });
    const form = { token, name: 'First Administrator', email: 'first@test.example', password: 'copper meadow sextant' };
    expect((await client.post('/api/accounts/invitation-answers', form)).status).toBe(200);
    expect(
      (await client.post('/api/accounts/invitation-answers', { ...form, email: 'second@test.example' })).status,
    ).toBe(404);
    expect(await app.backend.inviteFirstAdministrator()).toBeNull();
  });

  it('gives roles with an audit row, and never takes the last administrator', async () => {
    const administrator = await app.client('administrator');
    const person = await app.person({ name: 'New Coordinator' });
    const signedIn = await app.signIn(person);
    expect(
      (await administrator.put(`/api/accounts/people/${person.id}/roles`, { roles: ['coordinator'] })).body,
    ).toMatchObject({ roles: ['coordinator'] });
    expect((await signedIn.get<Session>('/api/accounts/session')).body.person).toBeNull();
    const audit = await app.rows<{ fields: string[] }>(
      "select fields from audit_entries where action = 'accounts.change-roles' and subject_id = $1",
      [person.id],
    );
    expect(audit).toEqual([{ fields: ['coordinator'] }]);

    const others = await app.rows<{ person_id: string }>(
      "select person_id from person_roles where role = 'administrator' and person_id <> $1",
      [administrator.person.id],
    );
    for (const other of others) await administrator.put(`/api/accounts/people/${other.person_id}/roles`, { roles: [] });
    const last = await administrator.put<ProblemDetails>(`/api/accounts/people/${administrator.person.id}/roles`, {
      roles: [],
    });
    expect(last.status).toBe(409);
    expect((await app.rows("select 1 from person_roles where role = 'administrator'")).length).toBe(1);
  });

  it('is refused to everybody else', async () => {
    const coordinator = await app.client('coordinator');
    expect((await coordinator.get('/api/accounts/people')).status).toBe(403);
    expect((await (await app.visitor()).get('/api/accounts/people')).status).toBe(401);
  });
});

describe('requests that no page of ours made', () => {
  it('are refused: without the token, from another site, in another format', async () => {
    const client = await app.client();
    const forged = await client.send(
      'POST',
      '/api/accounts/reset-requests',
      { email: 'a@b.example' },
      { 'x-xsrf-token': 'forged' },
    );
    expect(forged.status).toBe(403);
    const foreign = await client.post(
      '/api/accounts/reset-requests',
      { email: 'a@b.example' },
      { 'sec-fetch-site': 'cross-site' },
    );
    expect(foreign.status).toBe(403);
    const text = await client.post('/api/accounts/reset-requests', 'email=a@b.example', {
      'content-type': 'text/plain',
    });
    expect(text.status).toBe(415);
    const broken = await client.post<ProblemDetails>('/api/accounts/reset-requests', '{"email":');
    expect([broken.status, broken.body.code]).toEqual([400, 'invalid']);
  });
});
