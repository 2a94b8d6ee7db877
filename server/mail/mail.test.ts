import { mkdtempSync, appendFileSync, rmSync, statSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { invitationLetter } from './invitationLetter.ts';
import { listFakeLetters } from './listFakeLetters.ts';
import { openMail } from './openMail.ts';
import { passwordResetLetter } from './passwordResetLetter.ts';
import { sendLetter } from './sendLetter.ts';

const folders: string[] = [];
afterEach(() => folders.splice(0).forEach((folder) => rmSync(folder, { recursive: true })));

const invitation = invitationLetter({
  to: 'mika@example.org',
  businessName: 'Suds & <Sons>',
  inviterName: 'Odile',
  roleWords: 'groomer',
  url: 'https://example.org/join?t=abc&x=1',
  validDays: 7,
});

describe('letters', () => {
  it('say the same in plain text and HTML, with words escaped', () => {
    expect(invitation.subject).toBe('Suds & <Sons> invites you to Furlong');
    expect(invitation.text).toContain(
      'Odile invites you to join Suds & <Sons> on Furlong as groomer.',
    );
    expect(invitation.text).toContain('\nhttps://example.org/join?t=abc&x=1\n');
    expect(invitation.html).toContain('join Suds &amp; &lt;Sons&gt; on Furlong');
    expect(invitation.html).toContain('href="https://example.org/join?t=abc&amp;x=1"');
    expect(invitation.html).not.toContain('<Sons>');
    const reset = passwordResetLetter({
      to: 'a@example.org',
      name: 'Ines',
      url: 'https://example.org/reset#x',
      validMinutes: 30,
    });
    expect(reset.text).toContain('works once and for 30 minutes');
  });
});

describe('the fake mailbox', () => {
  it('keeps letters over a restart, newest first, readable by us alone', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'furlong-mail-'));
    folders.push(folder);
    const settings = { smtpUrl: null, from: 'Furlong <hello@example.org>', folder };
    openMail(settings);
    await sendLetter(invitation);
    await sendLetter({ ...invitation, to: 'tobi@example.org' });
    expect(statSync(join(folder, 'letters.jsonl')).mode & 0o077).toBe(0);
    appendFileSync(join(folder, 'letters.jsonl'), '\n{"id":"half');
    openMail(settings);
    await sendLetter({ ...invitation, to: 'ines@example.org' });
    openMail(settings);
    const letters = listFakeLetters()!;
    expect(letters.map((letter) => letter.to)).toEqual([
      'ines@example.org',
      'tobi@example.org',
      'mika@example.org',
    ]);
    expect(letters[2]).toMatchObject({ subject: invitation.subject, text: invitation.text });
    expect(letters[0]!.id).not.toBe(letters[1]!.id);
  });
});

describe('a real mail server', () => {
  it('gets the letter over SMTP with both bodies', async () => {
    const server = await startSmtp();
    const mailer = openMail({
      smtpUrl: `smtp://127.0.0.1:${server.port}`,
      from: 'Furlong <hello@example.org>',
      folder: null,
    });
    await sendLetter(invitation);
    mailer.close();
    await server.close();
    expect(server.said).toContain('RCPT TO:<mika@example.org>');
    expect(server.said).toContain('From: Furlong <hello@example.org>');
    expect(server.said).toContain('multipart/alternative');
    expect(listFakeLetters()).toBeNull();
  });

  it('is refused by name when the address is not SMTP', () => {
    expect(() => openMail({ smtpUrl: 'mail.example.org', from: 'x', folder: null })).toThrow(
      /SMTP_URL: must start with smtp/,
    );
  });
});

/** A mail server of one page: just the words of RFC 5321 that a sender needs. */
async function startSmtp() {
  const state = { said: '', port: 0, close: async () => {} };
  const server = createServer((socket) => {
    let inData = false;
    socket.write('220 test ready\r\n');
    socket.on('data', (chunk) => {
      const text = chunk.toString('utf8');
      state.said += text;
      if (inData) {
        if (!state.said.endsWith('\r\n.\r\n')) return;
        inData = false;
        socket.write('250 kept\r\n');
      } else if (text.startsWith('DATA')) {
        inData = true;
        socket.write('354 go on\r\n');
      } else if (text.startsWith('QUIT')) socket.end('221 bye\r\n');
      else socket.write('250 fine\r\n');
    });
    socket.on('error', () => {});
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.address();
  state.port = typeof address === 'object' && address ? address.port : 0;
  state.close = () => new Promise((resolve) => server.close(() => resolve()));
  return state;
}
