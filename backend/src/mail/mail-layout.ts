import type { MailPayload } from '../jobs/job-kinds';

export interface MailContent {
  readonly to: string;
  readonly subject: string;
  /** Paragraphs, in plain words. */
  readonly lines: readonly string[];
  readonly link: { readonly label: string; readonly url: string } | null;
  readonly footer: string;
}

/** Plain text and HTML of one mail; readable on a phone, no picture fetched from anywhere. */
export function layOutMail(content: MailContent): MailPayload {
  const link = content.link ? [`${content.link.label}: ${content.link.url}`] : [];
  return {
    to: content.to,
    subject: content.subject,
    text: [...content.lines, ...link, '', content.footer].join('\n\n'),
    html: html(content),
  };
}

function html({ subject, lines, link, footer }: MailContent): string {
  const paragraphs = lines
    .map((line) => `<p style="margin:0 0 14px">${escapeHtml(line).replace(/\n/g, '<br>')}</p>`)
    .join('');
  const button = link
    ? `<p style="margin:20px 0"><a href="${escapeHtml(link.url)}" style="background:#16332D;color:#FAF7F0;padding:12px 18px;text-decoration:none;border-radius:4px;display:inline-block">${escapeHtml(link.label)}</a></p>
       <p style="margin:0 0 14px;font-size:13px;color:#4C625C;word-break:break-all">${escapeHtml(link.url)}</p>`
    : '';
  return `<!doctype html><html><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>${escapeHtml(subject)}</title></head>
<body style="margin:0;background:#FAF7F0;color:#16332D;font:16px/1.5 'Work Sans',system-ui,sans-serif">
<div style="max-width:560px;margin:0 auto;padding:28px 20px">
<p style="margin:0 0 20px;border-bottom:3px solid #C8743C;padding-bottom:8px;font-weight:600">Firstcold</p>
${paragraphs}${button}
<p style="margin:28px 0 0;font-size:13px;color:#4C625C">${escapeHtml(footer)}</p>
</div></body></html>`;
}

function escapeHtml(text: string): string {
  const entities: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  };
  return text.replace(/[&<>"']/g, (character) => entities[character] ?? character);
}
