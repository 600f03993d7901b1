import { invitationLetter, resetLetter, warrantyReportLetter } from './letters';

const LINK = 'https://desk.example/welcome?token=1&purpose=reset';

describe.each([invitationLetter, resetLetter])('a letter', (write) => {
  it('given a name and a link, carries both in text and markup', () => {
    const letter = write({ email: 'a@network.example', name: 'Ansa' }, LINK);
    expect(letter.to).toBe('a@network.example');
    expect(letter.text).toContain('Hello Ansa,\n');
    expect(letter.text).toContain(`\n${LINK}\n`);
    expect(letter.html).toContain('href="https://desk.example/welcome?token=1&amp;purpose=reset"');
  });

  it('given a name with markup, line ends and turned text, keeps it one plain line', () => {
    const letter = write(
      { email: 'a@network.example', name: 'a\u0000\r\n\u2029b \u202e\u2066<i a=\'">&' },
      LINK,
    );
    expect(letter.text).toContain('Hello a b <i a=\'">&,\n');
    expect(letter.html).toContain('<p>Hello a b &lt;i a=&#39;&quot;&gt;&amp;,</p>');
  });

  it('given a name whose letters join (zero-width joiner), leaves it whole', () => {
    const name = 'می‌خواهم 👩‍🔧';
    expect(write({ email: 'a@network.example', name }, LINK).text).toContain(`Hello ${name},`);
  });
});

describe('warrantyReportLetter', () => {
  it('given a report, says of which day it is and where to read it, and no figure of it', () => {
    const link = 'https://desk.example/warranty/reports/7';
    const to = { email: 'a@network.example', name: 'Ansa' };
    const letter = warrantyReportLetter(to, '2026-01-31', link);
    expect(letter.text).toContain('as of 2026-01-31 was issued');
    expect(letter.text).toContain(`\n${link}\n`);
    expect(letter.html).toContain(`href="${link}"`);
    expect(letter.text.replaceAll('2026-01-31', '').replace(link, '')).not.toMatch(/\d/);
  });
});
