export interface MailContent {
  subject: string;
  text: string;
  html: string;
}

/** Plain paragraphs in both parts; the HTML one says the same words. */
export function mailContent({ subject, paragraphs }: { subject: string; paragraphs: string[] }): MailContent {
  const said = paragraphs.filter((paragraph) => paragraph !== '');
  return {
    subject: subject.replace(/[\r\n]+/g, ' '),
    text: `${said.join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(subject)}</title></head><body>${said
      .map((paragraph) => `<p>${linked(escapeHtml(paragraph).replace(/\n/g, '<br>'))}</p>`)
      .join('')}</body></html>`,
  };
}

export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}

function linked(html: string): string {
  return html.replace(/https?:\/\/[^\s<]+/g, (address) => `<a href="${address}">${address}</a>`);
}
