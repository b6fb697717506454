import type { Letter } from '../mail/letter.ts';

/** What the mails around a sign-off say. */
export const letters = {
  request(about: { client: string; shop: string; job: string; layout: string; letter: string; note: string; url: string; until: string }): Letter {
    return {
      subject: `${about.job}: please look at the layout for your wall`,
      paragraphs: [
        `Dear ${about.client},`,
        `${about.shop} has drawn a layout on your wall (${about.layout}, revision ${about.letter}). You can look at it, ask for changes, or sign it, on a phone or a computer. No password is needed.`,
        ...(about.note ? [about.note] : []),
      ],
      action: { words: 'Look at the layout', url: about.url },
      closing: `The link is yours alone and stays open until ${about.until}. Please do not pass it on: whoever holds it can sign.`,
    };
  },
  signed(about: { client: string; job: string; layout: string; letter: string; name: string; sha256: string; url: string }): Letter {
    return {
      subject: `${about.job}: ${about.layout} ${about.letter} is signed`,
      paragraphs: [`${about.client} has signed ${about.layout}, revision ${about.letter}, as "${about.name}".`, `What was signed is frozen. Its hash is ${about.sha256}`],
      action: { words: 'Open the job', url: about.url },
      closing: 'A change to the layout from now on makes the next revision.',
    };
  },
  copy(about: { client: string; shop: string; job: string; layout: string; letter: string; name: string; sha256: string; at: string }): Letter {
    return {
      subject: `${about.job}: your signature on ${about.layout} ${about.letter}`,
      paragraphs: [
        `Dear ${about.client},`,
        `Thank you. You signed ${about.layout}, revision ${about.letter}, as "${about.name}" on ${about.at}.`,
        `The record of what you signed cannot be changed. Its hash is ${about.sha256}`,
      ],
      closing: `${about.shop} will be in touch about building and hanging.`,
    };
  },
  changes(about: { client: string; job: string; layout: string; letter: string; words: string; url: string }): Letter {
    return {
      subject: `${about.job}: changes asked for in ${about.layout} ${about.letter}`,
      paragraphs: [`${about.client} asks for changes to ${about.layout}, revision ${about.letter}:`, about.words],
      action: { words: 'Open the job', url: about.url },
      closing: 'Answering this mail answers the client.',
    };
  },
};
