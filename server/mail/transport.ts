import { createTransport } from 'nodemailer';
import type { Message } from './messages';

export type MailConfig = { url: string; from: string };

export type MailTransport = {
  /** @param id the same for every try at one mail, so that a second copy can be told by its Message-ID */
  send(id: string, message: Message): Promise<void>;
  close(): void;
};

/** The one way out for mail: SMTP at the address of the configuration. */
export function openTransport({ url, from }: MailConfig): MailTransport {
  const transport = createTransport(url, {
    // a template never names a file or an address to take content from
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  const host = new URL(url).hostname;
  return {
    async send(id, { to, subject, text }) {
      await transport.sendMail({
        messageId: `<${id}@${host}>`,
        from,
        // as an object it is one address, whatever it holds
        to: { name: '', address: to },
        subject,
        text,
        // no holiday replies, please: RFC 3834
        headers: { 'Auto-Submitted': 'auto-generated' },
      });
    },
    close: () => transport.close(),
  };
}

/** Whether the other side refused for good (RFC 5321: a reply in the five hundreds), so that another try is no use. */
export function isRefusedForGood(error: unknown): boolean {
  const code = (error as { responseCode?: unknown }).responseCode;
  return typeof code === 'number' && code >= 500;
}
