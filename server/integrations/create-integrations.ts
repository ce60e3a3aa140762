import { createFileStore } from './files/create-file-store.ts'
import type { FileStore } from './files/file-store.ts'
import { createSmtpMailer } from './mail/create-smtp-mailer.ts'
import type { Mailer } from './mail/mailer.ts'
import { createStripeGateway } from './payment/create-stripe-gateway.ts'
import type { PaymentGateway } from './payment/payment-gateway.ts'
import type { Settings } from './settings.ts'

export type Integrations = {
  payment: PaymentGateway
  mail: Mailer
  files: FileStore
}

/** The outside services that the environment names. */
export function createIntegrations(settings: Settings): Integrations {
  return {
    payment: createStripeGateway({
      secretKey: settings.STRIPE_SECRET_KEY,
      webhookSecret: settings.STRIPE_WEBHOOK_SECRET,
      apiBase: settings.STRIPE_API_BASE,
    }),
    mail: createSmtpMailer({ url: settings.SMTP_URL, from: settings.MAIL_FROM }),
    files: createFileStore(settings.FILES_URL),
  }
}
