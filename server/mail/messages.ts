import type { Role } from '../../shared/domain/words';

/** What a mail holds beside its sender: plain text in plain words, nothing that is fetched or counted when it is read. */
export type Message = { to: string; subject: string; text: string };

type Invitation = {
  to: string;
  name: string | null;
  team: string;
  role: Role;
  invitedBy: string;
  link: string;
  /** the last day on which the link works, as people write it */
  until: string;
  hasAccount: boolean;
};

const roleSentences: Record<Role, string> = {
  owner: 'You will run the team together with its other owners.',
  coach: 'You will plan sessions, film them and publish them.',
  editor: 'You will look after chapters, captions and cues.',
  member: 'You will find each day’s session there, and every movement shown.',
};

export function invitationMessage(about: Invitation): Message {
  return {
    to: about.to,
    subject: `${about.invitedBy} invites you to ${about.team}`,
    text: paragraphs(
      greeting(about.name),
      `${about.invitedBy} invites you to the team ${about.team} on Tapeline, its private library of training footage. ${roleSentences[about.role]}`,
      `${about.hasAccount ? 'Join with the password that you have already:' : 'Join and choose a password:'}\n${about.link}`,
      `The link works once, until ${about.until}. If you did not expect it, do nothing: without the link nothing happens.`,
    ),
  };
}

export function newPasswordMessage(about: { to: string; name: string; link: string; minutes: number }): Message {
  return {
    to: about.to,
    subject: 'A new password for Tapeline',
    text: paragraphs(
      greeting(about.name),
      `Somebody, probably you, asked for a new password. Choose it here:\n${about.link}`,
      `The link works once, for ${about.minutes} minutes. If it was not you, do nothing: your password stays as it is.`,
    ),
  };
}

export function passwordChangedMessage(about: { to: string; name: string; link: string }): Message {
  return {
    to: about.to,
    subject: 'Your password for Tapeline was changed',
    text: paragraphs(
      greeting(about.name),
      'Your password was changed just now, and you were signed out on your other devices.',
      `If it was not you, ask for a new password at once and tell the owner of your team:\n${about.link}`,
    ),
  };
}

const greeting = (name: string | null) => (name ? `Hello ${name},` : 'Hello,');
const paragraphs = (...parts: string[]) => `${parts.join('\n\n')}\n`;
