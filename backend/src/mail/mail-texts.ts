import type { Language } from '#shared/checklist/text';
import type { MailPayload } from '../jobs/job-kinds';
import { layOutMail } from './mail-layout';

interface Recipient {
  readonly email: string;
  readonly language: Language;
  readonly name: string;
}

const FOOTER: Readonly<Record<Language, string>> = {
  en: 'You get this mail because you have a role in this opening.',
  es: 'Recibe este correo porque tiene una función en esta apertura.',
};

/** To the installer: steps were sent back, with the lead's remarks. */
export function sentBackMail(
  to: Recipient,
  facts: {
    readonly circuit: string;
    readonly opening: string;
    readonly lead: string;
    readonly remarks: readonly { readonly step: string; readonly text: string }[];
    readonly url: string;
  },
): MailPayload {
  const remarks = facts.remarks.map((remark) => `${remark.step}\n${remark.text}`);
  const english = to.language === 'en';
  return layOutMail({
    to: to.email,
    subject: english
      ? `Sent back: circuit ${facts.circuit}, ${facts.opening}`
      : `Devuelto: circuito ${facts.circuit}, ${facts.opening}`,
    lines: [
      english
        ? `${facts.lead} looked at circuit ${facts.circuit} and asks you to do ${facts.remarks.length === 1 ? 'one step' : `${facts.remarks.length} steps`} again:`
        : `${facts.lead} revisó el circuito ${facts.circuit} y le pide repetir ${facts.remarks.length === 1 ? 'un paso' : `${facts.remarks.length} pasos`}:`,
      ...remarks,
    ],
    link: { label: english ? 'Open the circuit' : 'Abrir el circuito', url: facts.url },
    footer: FOOTER[to.language],
  });
}

/** To the contractor: a handover package was issued. */
export function packageIssuedMail(
  to: Recipient,
  facts: {
    readonly opening: string;
    readonly version: number;
    readonly approved: number;
    readonly total: number;
    readonly sha256: string;
    readonly fingerprint: string;
    readonly url: string;
  },
): MailPayload {
  const english = to.language === 'en';
  return layOutMail({
    to: to.email,
    subject: english
      ? `Handover package ${facts.version}: ${facts.opening}`
      : `Paquete de entrega ${facts.version}: ${facts.opening}`,
    lines: english
      ? [
          `Version ${facts.version} of the refrigeration handover package for ${facts.opening} is ready: ${facts.approved} of ${facts.total} circuits are approved.`,
          'Open it, read it, and sign for it there.',
          `SHA-256 of the document: ${facts.sha256}\nFingerprint of the signing key: ${facts.fingerprint}`,
        ]
      : [
          `La versión ${facts.version} del paquete de entrega de refrigeración de ${facts.opening} está lista: ${facts.approved} de ${facts.total} circuitos están aprobados.`,
          'Ábralo, léalo y fírmelo allí.',
          `SHA-256 del documento: ${facts.sha256}\nHuella de la clave de firma: ${facts.fingerprint}`,
        ],
    link: { label: english ? 'Open the package' : 'Abrir el paquete', url: facts.url },
    footer: FOOTER[to.language],
  });
}
