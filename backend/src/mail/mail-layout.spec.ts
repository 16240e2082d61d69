import { describe, expect, it } from '@jest/globals';
import { layOutMail } from './mail-layout';
import { packageIssuedMail, sentBackMail } from './mail-texts';

const EVIL = `<img src=x onerror="alert('1')">&`;

describe('layOutMail', () => {
  const mail = layOutMail({
    to: 'lead@cold.example',
    subject: `Circuit ${EVIL}`,
    lines: [`Line ${EVIL}`, 'Step\nRemark'],
    link: { label: EVIL, url: `https://cold.example/a?b="><script>` },
    footer: EVIL,
  });

  it('shows markup in what people wrote as text', () => {
    expect(mail.html).not.toMatch(/<img|<script|onerror="/);
    expect(mail.html.match(/&lt;img/g)).toHaveLength(4);
    expect(mail.html).toContain('&amp;');
  });

  it('fetches nothing from anywhere', () => {
    expect(mail.html).not.toMatch(/<(img|link|iframe|object)\b|url\(|src=["']?http/i);
  });

  it('has the same words in plain text, as they were written', () => {
    expect(mail.text).toContain(`Line ${EVIL}`);
    expect(mail.text).toContain('https://cold.example/a');
  });

  it('keeps lines of a paragraph apart', () => {
    expect(mail.html).toContain('Step<br>Remark');
  });

  it('has no button where there is no link', () => {
    const plain = layOutMail({ to: 'a@b.example', subject: 's', lines: ['l'], link: null, footer: 'f' });
    expect(plain.html).not.toContain('<a ');
  });
});

describe('sentBackMail', () => {
  const facts = {
    circuit: 'A12',
    opening: 'Harbor Street',
    lead: 'Lee Ad',
    url: 'https://cold.example/w/1',
    remarks: [{ step: 'Superheat, coil 1', text: 'Read it again.' }],
  };

  it.each([
    ['en', 1, 'one step again'],
    ['en', 2, '2 steps again'],
    ['es', 1, 'repetir un paso'],
    ['es', 2, 'repetir 2 pasos'],
  ] as const)('counts the steps in %s for %i', (language, count, words) => {
    const remarks = Array.from({ length: count }, () => facts.remarks[0] as { step: string; text: string });
    const mail = sentBackMail({ email: 'i@cold.example', language, name: 'I' }, { ...facts, remarks });
    expect(mail.text).toContain(words);
    expect(mail.text).toContain('Read it again.');
    expect(mail.subject).toContain('A12');
  });
});

describe('packageIssuedMail', () => {
  it.each(['en', 'es'] as const)('names the document’s hash and the key’s fingerprint in %s', (language) => {
    const mail = packageIssuedMail(
      { email: 'c@build.example', language, name: 'C' },
      {
        opening: 'Harbor Street',
        version: 3,
        approved: 88,
        total: 90,
        sha256: 'a'.repeat(64),
        fingerprint: 'b'.repeat(64),
        url: 'https://cold.example/p/1',
      },
    );
    for (const body of [mail.text, mail.html]) {
      expect(body).toContain('a'.repeat(64));
      expect(body).toContain('b'.repeat(64));
      expect(body).toContain('https://cold.example/p/1');
    }
    expect(mail.text).toMatch(/88 (of|de) 90/);
  });
});
