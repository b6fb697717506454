/** A mail before it is sent: paragraphs, and at most one thing to do. */
export interface Letter {
  subject: string;
  paragraphs: string[];
  action?: { words: string; url: string };
  closing: string;
}

const escape = (text: string) =>
  text.replace(/[&<>"']/g, (c) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' })[c] ?? c);

/** Line ends in a header would begin another header: they become spaces. */
export const headerText = (text: string) => text.replace(/[\r\n\t\0]+/g, ' ').trim();

export function letterText(letter: Letter): string {
  const action = letter.action ? [`${letter.action.words}:\n${letter.action.url}`] : [];
  return [...letter.paragraphs, ...action, letter.closing].join('\n\n') + '\n';
}

/** Small, legible HTML without pictures from elsewhere, scripts or tracking. */
export function letterHtml(letter: Letter): string {
  const p = (text: string) => `<p style="margin:0 0 14px">${escape(text).replace(/\n/g, '<br>')}</p>`;
  const action = letter.action
    ? `<p style="margin:20px 0"><a href="${escape(letter.action.url)}" style="background:#1F5AA6;color:#ffffff;padding:12px 18px;text-decoration:none;font-weight:700">${escape(letter.action.words)}</a></p><p style="margin:0 0 14px;font-size:13px">Or copy this address: ${escape(letter.action.url)}</p>`
    : '';
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escape(letter.subject)}</title></head><body style="margin:0;padding:24px;background:#F5F2EA;color:#1E2B2A;font-family:'Nunito Sans',Arial,sans-serif;font-size:16px;line-height:1.5"><div style="max-width:560px;margin:0 auto">${letter.paragraphs.map(p).join('')}${action}${p(letter.closing)}</div></body></html>`;
}
