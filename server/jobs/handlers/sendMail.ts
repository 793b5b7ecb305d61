import { isRefusedForGood, type MailConfig, openTransport } from '../../mail/transport';
import { sendMail } from '../definitions';
import { type Handler, handle } from '../handler';

/**
 * Hands a mail to the SMTP server. Its text may hold a link's secret, which therefore lies in the queue until it is sent:
 * the row goes when it is, the link works once and not for long, and whoever reads the database could change passwords anyway.
 * A refusal for good ends the job, so that the text does not stay either.
 */
export function sendMailHandler(config: MailConfig): Handler {
  return handle(sendMail, async ({ id, ...message }, { log }) => {
    const transport = openTransport(config);
    try {
      await transport.send(id, message);
    } catch (error) {
      if (!isRefusedForGood(error)) throw error;
      log.error({ mailId: id, code: (error as { responseCode?: number }).responseCode }, 'mail refused for good');
    } finally {
      transport.close();
    }
  });
}
