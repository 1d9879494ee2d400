import "server-only";
import { render } from "@react-email/components";
import { createElement, type ReactElement } from "react";
import { FollowLinkEmail, PasswordChangedEmail, ResetPasswordEmail, SignInLinkEmail, VerifyAddressEmail } from "@/emails/account";
import { CaseNewsEmail, caseNewsSubject } from "@/emails/case-news";
import { InvitationEmail, invitationSubject } from "@/emails/invitation";
import { ReceiptEmail, receiptSubject } from "@/emails/receipt";
import type { CaseNews, MailPayloads } from "@/lib/outbox/types";
import type { MailKind } from "@/lib/outbox/vocabulary";

type Template<P> = { subject: (payload: P) => string; body: (payload: P) => ReactElement };

const news: Template<CaseNews> = { subject: caseNewsSubject, body: (payload) => createElement(CaseNewsEmail, payload) };

const TEMPLATES: { [K in MailKind]: Template<MailPayloads[K]> } = {
  "verify-address": { subject: () => "Check your address for Towfolio", body: (payload) => createElement(VerifyAddressEmail, payload) },
  "sign-in-link": { subject: () => "Your sign-in link for Towfolio", body: (payload) => createElement(SignInLinkEmail, payload) },
  "reset-password": { subject: () => "Choose a new password for Towfolio", body: (payload) => createElement(ResetPasswordEmail, payload) },
  "password-changed": { subject: () => "Your Towfolio password was changed", body: (payload) => createElement(PasswordChangedEmail, payload) },
  invitation: { subject: invitationSubject, body: (payload) => createElement(InvitationEmail, payload) },
  receipt: { subject: receiptSubject, body: (payload) => createElement(ReceiptEmail, payload) },
  "follow-link": { subject: ({ unit }) => `Follow the move of ${unit}`, body: (payload) => createElement(FollowLinkEmail, payload) },
  "finding-posted": news, "finding-answered": news, "finding-replied": news, "acceptance-signed": news,
  "quote-given": news, movement: news, arrival: news, "move-closed": news,
};

/** One line, without what would start another header or, as an encoded word (RFC 2047), read as other text; cut between characters, not within one. */
const oneLine = (subject: string) => Array.from(subject.replace(/[\s\p{Cc}]+/gu, " ").replaceAll("=?", "= ?").trim()).slice(0, 180).join("");

/** Subject, HTML and plain text of a message. */
export async function renderMail<K extends MailKind>(kind: K, payload: MailPayloads[K]): Promise<{ subject: string; html: string; text: string }> {
  const template: Template<MailPayloads[K]> = TEMPLATES[kind];
  const body = template.body(payload);
  return { subject: oneLine(template.subject(payload)), html: await render(body), text: await render(body, { plainText: true }) };
}
