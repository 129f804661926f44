import { expect, test } from 'vitest';
import { sharedStudyLetter } from '#server/mail/letters';
import { renderHtml, renderSubject, renderText } from '#server/mail/rendering';

const hostile = sharedStudyLetter('https://siltline.example', {
  sharerName: '<b>Eve</b>\r\nBcc: x@evil.example',
  title: '"><img src=x onerror=alert(1)> {{7*7}} &amp; \u202etxt',
  studyId: 'AAAAAAAAAAAAAAAAAAAAAA',
  may: 'view',
});

test('when a name has line breaks, then the subject is one line', () => {
  expect(renderSubject(hostile)).toBe('<b>Eve</b> Bcc: x@evil.example shared a study with you');
});

test('when a title holds markup, then the HTML shows it and the text has it as typed', () => {
  const html = renderHtml(hostile);
  expect(html).not.toMatch(/<img|<b>/);
  expect(html).toContain('&quot;&gt;&lt;img src=x onerror=alert(1)&gt; {{7*7}} &amp;amp;');
  expect(html).not.toContain('\u202e');
  expect(renderText(hostile)).toContain('"><img src=x onerror=alert(1)> {{7*7}} &amp;');
});

test('when a mail is rendered, then both forms carry the link and the reason', () => {
  for (const form of [renderText(hostile), renderHtml(hostile)]) {
    expect(form).toContain('https://siltline.example/studies/AAAAAAAAAAAAAAAAAAAAAA');
    expect(form).toContain('This was sent because');
  }
});
