import { createTransport, type Transporter } from 'nodemailer';
import type { MailPayload } from '../jobs/job-kinds';
import type { JobRun } from '../jobs/job-worker';

export interface MailConfig {
  readonly host: string;
  readonly port: number;
  readonly user: string | null;
  readonly password: string | null;
  readonly from: string;
}

/** SMTP, through nodemailer. */
export class Mailer {
  private readonly transporter: Transporter;

  constructor(private readonly config: MailConfig) {
    this.transporter = createTransport({
      host: config.host,
      port: config.port,
      secure: config.port === 465,
      // A local inbox has no certificate; anything else is upgraded where the server offers it.
      ignoreTLS: config.host === '127.0.0.1',
      ...(config.user ? { auth: { user: config.user, pass: config.password ?? '' } } : {}),
      connectionTimeout: 10_000,
      greetingTimeout: 10_000,
      socketTimeout: 20_000,
    });
  }

  /** Sends a mail job. After a crash it may go out twice, then with the same Message-ID. */
  async send(mail: MailPayload, run: Pick<JobRun, 'id'>): Promise<void> {
    const domain = /@([^>\s]+)/.exec(this.config.from)?.[1] ?? 'localhost';
    await this.transporter.sendMail({
      from: this.config.from,
      to: { name: '', address: mail.to },
      subject: mail.subject,
      text: mail.text,
      html: mail.html,
      messageId: `<${run.id}@${domain}>`,
    });
  }

  /** @throws when the server can't be reached */
  async ping(): Promise<void> {
    await this.transporter.verify();
  }
}
