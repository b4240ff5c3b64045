import "server-only";
import nodemailer from "nodemailer";
import { z } from "zod";
import { env } from "@/lib/env";
import type { JobHandler } from "@/lib/jobs/handler";
import { mailBody } from "./mail-body";

const mailPayload = z.object({
  to: z.string(),
  subject: z.string(),
  news: z.string(),
  facts: z.array(z.tuple([z.string(), z.string()])),
  button: z.object({ label: z.string(), path: z.string() }).nullable(),
  after: z.string().optional(),
});

let transport: ReturnType<typeof nodemailer.createTransport> | undefined;

/** The mail relay of this installation. */
export function mailTransport() {
  const { SMTP_HOST, SMTP_PORT, SMTP_SECURE, SMTP_USER, SMTP_PASSWORD } = env();
  transport ??= nodemailer.createTransport({
    host: SMTP_HOST,
    port: SMTP_PORT,
    secure: SMTP_SECURE,
    connectionTimeout: 10_000,
    socketTimeout: 20_000,
    ...(SMTP_USER && SMTP_PASSWORD && { auth: { user: SMTP_USER, pass: SMTP_PASSWORD } }),
  });
  return transport;
}

export const sendMailJob: JobHandler = {
  async run(payload) {
    const mail = mailPayload.parse(payload);
    const { text, html } = mailBody(mail);
    await mailTransport().sendMail({
      from: env().MAIL_FROM,
      to: mail.to,
      subject: mail.subject,
      text,
      html,
    });
  },
};
